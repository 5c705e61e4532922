import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { injectCan } from '../../platform/session/ability';
import { DurationPipe } from '../../ui/formats/duration.pipe';
import { Panel } from '../../ui/panel/panel';

/** What was clocked in the shop's current workweek, beside what is left of the plan. */
@Component({
  selector: 'bm-clocked-this-week',
  imports: [DurationPipe, Panel, RouterLink],
  templateUrl: './clocked-this-week.html',
  styleUrl: './clocked-this-week.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClockedThisWeek {
  readonly job = input.required<Job>();
  protected readonly can = injectCan();
  protected readonly rows = computed(() =>
    this.job()
      .operations.filter(({ thisWeekMinutes }) => thisWeekMinutes > 0)
      .map((row) => ({ ...row, left: leftText(row.plannedMinutes, row.clockedMinutes) })),
  );
  protected readonly total = computed(() =>
    this.rows().reduce((sum, { thisWeekMinutes }) => sum + thisWeekMinutes, 0),
  );
}

/** Of a plan: what is left, or how far over it is. */
function leftText(planned: number, clocked: number): { text: string; over: boolean } {
  if (planned === 0) return { text: 'not planned', over: false };
  if (clocked > planned) return { text: `${formatHours(clocked - planned)} over`, over: true };
  return { text: formatHours(planned - clocked), over: false };
}
