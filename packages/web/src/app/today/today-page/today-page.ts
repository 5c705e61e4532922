import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { Store } from '@ngrx/store';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { BookkeeperPage } from '../bookkeeper-page/bookkeeper-page';
import { LeadHandPage } from '../lead-hand-page/lead-hand-page';
import { OwnerPage } from '../owner-page/owner-page';
import { TodayPage } from '../state/today.actions';
import { todayFeature } from '../state/today.state';

/** The first page of whoever is signed in. */
@Component({
  selector: 'bm-today',
  imports: [BookkeeperPage, LeadHandPage, OwnerPage, PageHead, Panel, ProblemNote, Skeleton],
  template: `
    @if (page(); as shown) {
      @switch (shown.role) {
        @case ('owner') {
          <bm-owner-page [page]="shown" />
        }
        @case ('bookkeeper') {
          <bm-bookkeeper-page [page]="shown" />
        }
        @case ('lead-hand') {
          <bm-lead-hand-page [page]="shown" />
        }
      }
    } @else {
      <bm-page-head name="Today" />
      @if (problem(); as failed) {
        <bm-problem-note [problem]="failed" [retryable]="true" (retry)="load()" />
      } @else {
        <div class="bm-columns" aria-busy="true">
          @for (panel of [1, 2]; track panel) {
            <bm-panel>
              <bm-skeleton width="30%" /><bm-skeleton width="85%" /><bm-skeleton width="70%" />
              <bm-skeleton width="80%" />
            </bm-panel>
          }
        </div>
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TodayScreen {
  private readonly store = inject(Store);
  protected readonly page = this.store.selectSignal(todayFeature.selectPage);
  protected readonly problem = this.store.selectSignal(todayFeature.selectProblem);

  constructor() {
    this.load();
  }

  protected load(): void {
    this.store.dispatch(TodayPage.opened());
  }
}
