import { CdkDrag, CdkDropList, CdkDropListGroup, type CdkDragDrop } from '@angular/cdk/drag-drop';
import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import { JOB_STAGE_NAMES, JOB_TRANSITIONS } from '@bookmatch/common/jobs/job-stages';
import type { JobRow, JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { ChoiceField } from '../../ui/choice-field/choice-field';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { SearchField } from '../../ui/search-field/search-field';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { JobViews } from '../job-views/job-views';
import { placeOf } from '../place-of';
import { StageMoves } from '../stage-moves';
import { JobsPage } from '../state/jobs.actions';
import { selectJobBoard } from '../state/jobs.selectors';

/** The open jobs by stage. A card is taken on by dragging it, or from its menu. */
@Component({
  selector: 'bm-job-board',
  imports: [
    CdkDrag,
    CdkDropList,
    CdkDropListGroup,
    ChoiceField,
    DateTextPipe,
    EmptyState,
    JobViews,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    PageHead,
    ProblemNote,
    RouterLink,
    SearchField,
    Skeleton,
  ],
  templateUrl: './job-board.html',
  styleUrl: './job-board.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobBoard {
  private readonly store = inject(Store);
  private readonly moves = inject(StageMoves);
  protected readonly can = injectCan();
  protected readonly address = injectListAddress('assigned');
  protected readonly board = this.store.selectSignal(selectJobBoard);
  protected readonly movable = computed(() => this.can('update', 'Job'));

  protected readonly stageNames = JOB_STAGE_NAMES;
  protected readonly placeOf = placeOf;
  protected readonly reachable = JOB_TRANSITIONS;
  protected readonly assignments = [
    { value: '', name: 'All jobs' },
    { value: 'me', name: 'My jobs' },
  ];

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const { q, assigned } = this.address.query();
    this.store.dispatch(
      JobsPage.boardOpened({ query: { ...(q ? { q } : {}), ...(assigned ? { assigned } : {}) } }),
    );
  }

  protected dropped({ item, container }: CdkDragDrop<JobStage, JobStage, JobRow>): void {
    this.move(item.data, container.data);
  }

  protected move(job: JobRow, stage: JobStage): void {
    if (job.stage !== stage) this.moves.ask(job, stage);
  }

  protected hours({ clockedMinutes, plannedMinutes }: JobRow): string {
    return `${formatHours(clockedMinutes)} of ${formatHours(plannedMinutes)}`;
  }

  /** How much of the planned time is used, in percent, at most the whole bar. */
  protected used({ clockedMinutes, plannedMinutes }: JobRow): number {
    return plannedMinutes === 0 ? 0 : Math.min(100, (clockedMinutes / plannedMinutes) * 100);
  }
}
