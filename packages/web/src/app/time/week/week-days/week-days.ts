import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import type { MemberWeek } from '@bookmatch/common/time/week-contract';
import { injectCan } from '../../../platform/session/ability';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { DurationPipe } from '../../../ui/formats/duration.pipe';
import { MoneyPipe } from '../../../ui/formats/money.pipe';
import { StatusChip } from '../../../ui/status-chip/status-chip';
import { jobOf, whatOf } from '../../punches/work-words';
import { daysWithEntries } from '../days-with-entries';

/** A member's week, day by day with its entries; those who may correct time do so from here. */
@Component({
  selector: 'bm-week-days',
  imports: [
    DateTextPipe,
    DurationPipe,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyPipe,
    RouterLink,
    StatusChip,
  ],
  templateUrl: './week-days.html',
  styleUrl: './week-days.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WeekDays {
  readonly week = input.required<MemberWeek>();
  readonly corrected = output<TimeEntryRow>();
  readonly voided = output<TimeEntryRow>();
  /** A missing stretch is to be added on the day. */
  readonly added = output<string>();

  private readonly can = injectCan();
  protected readonly mayCorrect = computed(() => this.can('correct', 'TimeEntry'));
  protected readonly seesJobs = computed(() => this.can('read', 'Job'));
  protected readonly days = computed(() => {
    const week = this.week();
    return daysWithEntries(week, dateIn(week.timeZone, new Date().toISOString()));
  });
  protected readonly whatOf = whatOf;
  protected readonly jobOf = jobOf;
}
