import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import type { JobRow } from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { CurrentShop } from '../../platform/session/current-shop';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { PageHead } from '../../ui/page-head/page-head';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { placeOf } from '../place-of';
import { JobsPage } from '../state/jobs.actions';
import { selectJobList } from '../state/jobs.selectors';

/** The crew's jobs on a phone: those assigned first, then those open to everybody. Made for gloves and one thumb. */
@Component({
  selector: 'bm-my-jobs',
  imports: [DateTextPipe, EmptyState, PageHead, ProblemNote, RouterLink, Skeleton, StatusChip],
  templateUrl: './my-jobs.html',
  styleUrl: './my-jobs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MyJobs {
  private readonly store = inject(Store);
  private readonly shop = inject(CurrentShop);
  protected readonly list = this.store.selectSignal(selectJobList);
  protected readonly stageNames = JOB_STAGE_NAMES;
  protected readonly placeOf = placeOf;
  protected readonly groups = computed(() => {
    const memberId = this.shop.membership()?.memberId ?? '';
    const isMine = ({ assignedMemberIds }: JobRow): boolean => assignedMemberIds.includes(memberId);
    const rows = this.list().rows;
    return [
      { name: 'Assigned to you', rows: rows.filter(isMine) },
      { name: 'Open to the crew', rows: rows.filter((row) => !isMine(row)) },
    ].filter(({ rows: some }) => some.length > 0);
  });

  constructor() {
    this.load();
  }

  /** A shop has dozens of open jobs, so one page holds them, the soonest install first. */
  protected load(): void {
    this.store.dispatch(JobsPage.listOpened({ query: { stage: 'open', sort: 'installOn', limit: '200' } }));
  }
}
