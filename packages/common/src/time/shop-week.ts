import {
  addDays,
  dateIn,
  daysOfWeek,
  startOfDay,
  type DateText,
  type InstantText,
} from '../calendar/shop-dates.js';
import { elapsedMinutes } from './punch.js';
import type { TimeKind } from './time-contract.js';
import type { WeekDay } from './week-contract.js';

/** What the week needs of a time entry that is closed. */
export type Stretch = { kind: TimeKind; startedAt: InstantText; endedAt: InstantText };
export type DayPart = { on: DateText; minutes: number };

/**
 * An entry cut at each midnight of the shop's zone it runs across. Each part is what passed up to its end less what
 * passed up to its start, so that the parts add up to the entry's minutes even where it does not start on a minute.
 */
export function splitByDay(startedAt: InstantText, endedAt: InstantText, zone: string): DayPart[] {
  const parts: DayPart[] = [];
  let on = dateIn(zone, startedAt);
  let counted = 0;
  for (;;) {
    const dayEnds = startOfDay(zone, addDays(on, 1));
    const isLast = Date.parse(endedAt) <= Date.parse(dayEnds);
    const upTo = elapsedMinutes(startedAt, isLast ? endedAt : dayEnds);
    parts.push({ on, minutes: upTo - counted });
    if (isLast) return parts;
    counted = upTo;
    on = addDays(on, 1);
  }
}

/** The seven days of a workweek with what was worked on each. What lies before or after the week is not counted. */
export function weekDays(stretches: readonly Stretch[], startsOn: DateText, zone: string): WeekDay[] {
  const days = daysOfWeek(startsOn).map((on) => ({ on, workMinutes: 0, mealBreakMinutes: 0 }));
  for (const stretch of stretches) {
    for (const part of splitByDay(stretch.startedAt, stretch.endedAt, zone)) {
      const day = days.find(({ on }) => on === part.on);
      if (!day) continue;
      if (stretch.kind === 'work') day.workMinutes += part.minutes;
      else day.mealBreakMinutes += part.minutes;
    }
  }
  return days;
}

/** What the days of a week come to. */
export function weekTotals(days: readonly WeekDay[]): { workMinutes: number; mealBreakMinutes: number } {
  return {
    workMinutes: days.reduce((sum, day) => sum + day.workMinutes, 0),
    mealBreakMinutes: days.reduce((sum, day) => sum + day.mealBreakMinutes, 0),
  };
}

/** The instants a workweek reaches from and up to (not included): 167, 168 or 169 hours apart. */
export function weekBounds(startsOn: DateText, zone: string): { from: InstantText; to: InstantText } {
  return { from: startOfDay(zone, startsOn), to: startOfDay(zone, addDays(startsOn, 7)) };
}
