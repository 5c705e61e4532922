import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Store } from '@ngrx/store';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { REVISION_STATUS_NAMES } from '../estimate-names';
import { EstimatesApiClient } from '../estimates-api';
import { RevisionView } from '../revision-view/revision-view';
import { EstimatesPage } from '../state/estimates.actions';
import { selectEstimate, selectOpenProblem, selectRevision } from '../state/estimates.selectors';

/** An older revision, to be looked at. */
@Component({
  selector: 'bm-revision-page',
  imports: [DateTextPipe, MatButton, PageHead, Panel, ProblemNote, RevisionView, Skeleton, StatusChip],
  template: `
    @if (estimate(); as estimate) {
      @if (revision(); as revision) {
        <bm-page-head
          [number]="'Estimate ' + estimate.number"
          [backTo]="'/estimates/' + estimate.id"
          [name]="estimate.title + ', revision ' + revision.number"
        >
          <span bmFacts>
            <bm-status-chip>{{ names[revision.status] }}</bm-status-chip>
            @if (revision.sentAt) {
              sent {{ revision.sentAt | dateText: 'day-and-time' }}
            }
          </span>
          <a matButton="outlined" target="_blank" [href]="pdfUrl()"
            >PDF<span class="bm-spoken">, opens in a new window</span></a
          >
        </bm-page-head>
        <bm-revision-view [revision]="revision" />
      }
    } @else if (problem(); as problem) {
      <bm-problem-note [problem]="problem" [retryable]="true" (retry)="load()" />
    } @else {
      <bm-panel aria-busy="true"><bm-skeleton width="40%" /><bm-skeleton width="60%" /></bm-panel>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionPage {
  /** From the address. */
  readonly id = input.required<string>();
  readonly revisionId = input.required<string>();

  private readonly store = inject(Store);
  private readonly api = inject(EstimatesApiClient);
  protected readonly names = REVISION_STATUS_NAMES;
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  private readonly selected = computed(() => this.store.selectSignal(selectEstimate(this.id())));
  protected readonly estimate = computed(() => this.selected()());
  private readonly opened = computed(() =>
    this.store.selectSignal(selectRevision(this.id(), this.revisionId())),
  );
  protected readonly revision = computed(() => this.opened()());
  protected readonly pdfUrl = computed(() =>
    this.api.pdfUrl({ estimateId: this.id(), revisionId: this.revisionId() }),
  );

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const revision = { estimateId: this.id(), revisionId: this.revisionId() };
    untracked(() => this.store.dispatch(EstimatesPage.revisionOpened({ revision })));
  }
}
