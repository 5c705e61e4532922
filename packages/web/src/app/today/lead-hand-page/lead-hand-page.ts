import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { formatDuration } from '@bookmatch/common/calendar/format';
import type { LeadHandToday } from '@bookmatch/common/today/today-contract';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { JobHours } from '../job-hours/job-hours';
import { clockedTask, installTask } from '../task-list/task';
import { TaskList } from '../task-list/task-list';

/** The lead hand's day: what leaves the shop this week, how the jobs stand, and who works on what. */
@Component({
  selector: 'bm-lead-hand-page',
  imports: [DateTextPipe, JobHours, MatButton, PageHead, RouterLink, TaskList],
  template: `
    <bm-page-head name="Today">
      <span bmFacts>{{ page().on | dateText }}{{ ownDay() ? ' · ' + ownDay() : '' }}</span>
      <a matButton="filled" routerLink="/jobs/board">Jobs by stage</a>
    </bm-page-head>
    <div class="bm-columns">
      <div class="stack">
        <bm-task-list
          heading="Installs this week"
          listLink="/jobs"
          [listParams]="{ stage: 'open', sort: 'installOn' }"
          [tasks]="installs()"
          nothing="No install is set for this week."
        />
        <bm-task-list
          heading="On the clock"
          listLink="/time"
          [tasks]="clocked()"
          nothing="Nobody is clocked in."
        />
        <bm-task-list
          heading="Later jobs"
          listLink="/jobs"
          [listParams]="{ stage: 'open', sort: 'installOn' }"
          [tasks]="jobs()"
          [count]="page().jobsInHand.count"
          nothing="No other jobs in hand."
        />
      </div>
      <bm-job-hours [jobs]="page().jobsInHand.rows" [count]="page().jobsInHand.count" />
    </div>
  `,
  styleUrl: '../page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadHandPage {
  readonly page = input.required<LeadHandToday>();
  private readonly zone = inject(SHOP_ZONE);

  protected readonly installs = computed(() =>
    this.page().installsThisWeek.map((job) => installTask(job, this.page().on)),
  );
  protected readonly jobs = computed(() =>
    this.page()
      .jobsInHand.rows.filter((job) => !this.page().installsThisWeek.some(({ id }) => id === job.id))
      .map((job) => installTask(job, this.page().on)),
  );
  protected readonly clocked = computed(() =>
    this.page().onTheClock.map((entry) => clockedTask(entry, this.zone())),
  );
  protected readonly ownDay = computed(() => {
    const { open, todayMinutes } = this.page().clock;
    const worked = todayMinutes > 0 ? `you clocked ${formatDuration(todayMinutes)} so far` : '';
    return [worked, open ? 'you are on the clock' : ''].filter(Boolean).join(' · ');
  });
}
