import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import type { OwnerToday } from '@bookmatch/common/today/today-contract';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { AgingSpark } from '../aging-spark';
import { FigureTile } from '../figure-tile/figure-tile';
import { JobHours } from '../job-hours/job-hours';
import { StageBar, type StageCount } from '../stage-bar/stage-bar';
import { clockedTask, estimateTask, leadTask, overdueTask } from '../task-list/task';
import { TaskList } from '../task-list/task-list';

/** The owner's day: the thread at a glance, what waits for them, and how the work stands. */
@Component({
  selector: 'bm-owner-page',
  imports: [
    AgingSpark,
    DateTextPipe,
    FigureTile,
    JobHours,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    RouterLink,
    StageBar,
    TaskList,
  ],
  templateUrl: './owner-page.html',
  styleUrl: '../page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OwnerPage {
  readonly page = input.required<OwnerToday>();
  private readonly zone = inject(SHOP_ZONE);

  protected readonly leads = computed(() =>
    this.page().leadsToFollowUp.rows.map((lead) => leadTask(lead, this.page().on)),
  );
  protected readonly estimates = computed(() =>
    this.page().estimatesWaiting.rows.map((estimate) => estimateTask(estimate, this.zone(), this.page().on)),
  );
  protected readonly overdue = computed(() => this.page().overdueInvoices.rows.map(overdueTask));
  protected readonly clocked = computed(() =>
    this.page().onTheClock.map((entry) => clockedTask(entry, this.zone())),
  );
  protected readonly leadStages = computed<StageCount[]>(() =>
    this.page().leadsByStage.map(({ stage, count }) => ({
      key: stage,
      name: LEAD_STAGE_NAMES[stage],
      count,
    })),
  );
  protected readonly jobStages = computed<StageCount[]>(() =>
    this.page().jobsByStage.map(({ stage, count }) => ({
      key: stage,
      name: JOB_STAGE_NAMES[stage],
      count,
    })),
  );
  /** Those with a question come first, so the rows shown are enough to tell. */
  protected readonly asked = computed(() => {
    const asking = this.page().estimatesWaiting.rows.filter(({ openQuestions }) => openQuestions > 0);
    return asking.length > 0 ? `${asking.length} with a question` : '';
  });
  protected readonly openLeads = computed(() => total(this.leadStages()));
  protected readonly openJobs = computed(() => total(this.jobStages()));
  protected readonly weekHours = computed(() => formatHours(this.page().weekMinutes));
}

const total = (stages: readonly StageCount[]) => stages.reduce((sum, { count }) => sum + count, 0);
