import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import { splitByDay } from '@bookmatch/common/time/shop-week';
import type { MemberWeek, WeekDay } from '@bookmatch/common/time/week-contract';
import { dateIn, type DateText } from '@bookmatch/common/calendar/shop-dates';

/** `minutes`: the part of the entry that falls in the day; null while it is open. */
export type EntryOfDay = { entry: TimeEntryRow; minutes: number | null };
export type DayWithEntries = WeekDay & { entries: EntryOfDay[] };

/**
 * A week's days with the entries of each, up to today. One across midnight stands in both days, each time with its part.
 */
export function daysWithEntries({ days, entries, timeZone }: MemberWeek, today: DateText): DayWithEntries[] {
  const parts = entries.flatMap((entry) =>
    partsOf(entry, timeZone).map(({ on, minutes }) => ({ entry, on, minutes })),
  );
  return days
    .map((day) => ({
      ...day,
      entries: parts.filter(({ on }) => on === day.on).map(({ entry, minutes }) => ({ entry, minutes })),
    }))
    .filter((day) => day.on <= today || day.entries.length > 0);
}

function partsOf(
  { startedAt, endedAt }: TimeEntryRow,
  zone: string,
): { on: string; minutes: number | null }[] {
  if (endedAt === null) return [{ on: dateIn(zone, startedAt), minutes: null }];
  return splitByDay(startedAt, endedAt, zone);
}
