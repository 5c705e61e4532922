import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { ESTIMATE_STATUS_NAMES } from '@bookmatch/common/estimates/estimate-words';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import type { HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { DraftBuilder } from '../draft-builder/draft-builder';
import { ESTIMATE_STATUS_TONES } from '../estimate-names';
import { EstimatesApiClient } from '../estimates-api';
import { HeadForm } from '../head-form/head-form';
import { HistoryPanel } from '../history-panel/history-panel';
import { LinksPanel } from '../links-panel/links-panel';
import { QuestionsPanel } from '../questions-panel/questions-panel';
import { RevisionView } from '../revision-view/revision-view';
import { SendDialog, type SendSubject } from '../send-dialog/send-dialog';
import { EstimatesPage } from '../state/estimates.actions';
import { selectEstimate, selectOpenProblem } from '../state/estimates.selectors';

/** One estimate: its draft to write, or what was sent to read, and everything that happened to it. */
@Component({
  selector: 'bm-estimate-page',
  imports: [
    DateTextPipe,
    DraftBuilder,
    HistoryPanel,
    LinksPanel,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    NgTemplateOutlet,
    PageHead,
    Panel,
    ProblemNote,
    QuestionsPanel,
    RevisionView,
    RouterLink,
    Skeleton,
    StatusChip,
  ],
  templateUrl: './estimate-page.html',
  styles: 'bm-status-chip { margin-inline-end: 6px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EstimatePage implements HasUnsavedChanges {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  private readonly api = inject(EstimatesApiClient);
  private readonly confirm = inject(Confirm);
  private readonly dialog = inject(MatDialog);
  private readonly builder = viewChild(DraftBuilder);
  protected readonly can = injectCan();
  protected readonly statusNames = ESTIMATE_STATUS_NAMES;
  protected readonly statusTones = ESTIMATE_STATUS_TONES;

  private readonly selected = computed(() => this.store.selectSignal(selectEstimate(this.id())));
  protected readonly estimate = computed(() => this.selected()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  protected readonly writing = computed(
    () => this.estimate()?.currentRevision.status === 'draft' && this.can('update', 'Estimate'),
  );
  protected readonly wasSent = computed(
    () => this.estimate()?.revisions.some(({ status }) => status === 'sent') ?? false,
  );

  constructor() {
    effect(() => this.load());
  }

  hasUnsavedChanges(): boolean {
    return this.builder()?.hasUnsavedChanges() ?? false;
  }

  protected load(): void {
    const id = this.id();
    untracked(() => this.store.dispatch(EstimatesPage.estimateOpened({ id })));
  }

  protected pdfUrl({ id, currentRevision }: Estimate): string {
    return this.api.pdfUrl({ estimateId: id, revisionId: currentRevision.id });
  }

  /** What is on the screen goes to the server first: pages and letters show what is kept. */
  protected flush(): void {
    this.builder()?.saving.flush();
  }

  protected send({ id: estimateId }: Estimate): void {
    this.flush();
    const data: SendSubject = { estimateId };
    this.dialog.open(SendDialog, { data, width: '560px', disableClose: true });
  }

  protected revise(estimate: Estimate): void {
    this.store.dispatch(EstimatesPage.newRevisionPressed({ estimate }));
  }

  protected duplicate({ id }: Estimate): void {
    this.flush();
    this.store.dispatch(EstimatesPage.duplicatePressed({ id }));
  }

  protected editHead(estimate: Estimate): void {
    this.dialog.open(HeadForm, { data: estimate, width: '480px' });
  }

  protected decline(estimate: Estimate): void {
    const question = {
      title: 'Mark as declined?',
      text: 'The customer cannot accept this revision any more. A new revision can be sent later.',
      action: 'Mark as declined',
      reason: { label: 'What the customer said', required: false },
    };
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(EstimatesPage.declineConfirmed({ estimate, ...answer }));
    });
  }
}
