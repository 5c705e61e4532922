import { DateTime } from 'luxon';

/** A calendar date `YYYY-MM-DD`, without a zone. Dates compare as text. */
export type DateText = string;
/** An instant, ISO 8601 in UTC. */
export type InstantText = string;

/** The FLSA leaves the choice of the workweek's first day to the employer (29 CFR 778.105); here it is Monday. */
export const WORKWEEK_STARTS_ON = 1;

/** The date on the wall of the shop at an instant. */
export function dateIn(zone: string, instant: InstantText): DateText {
  return at(instant, zone).toFormat('yyyy-MM-dd');
}

/** The first instant of a date in the shop's zone, in UTC: not always 24 hours after the day before began. */
export function startOfDay(zone: string, date: DateText): InstantText {
  return at(date, zone).startOf('day').toUTC().toISO();
}

export function addDays(date: DateText, days: number): DateText {
  return utc(date).plus({ days }).toFormat('yyyy-MM-dd');
}

/** Days from one date to another; below zero when the second is earlier. */
export function daysBetween(from: DateText, to: DateText): number {
  return utc(to).diff(utc(from), 'days').days;
}

/** The first day of the workweek that a date lies in. */
export function weekStart(date: DateText): DateText {
  const day = utc(date).weekday;
  return addDays(date, -((day - WORKWEEK_STARTS_ON + 7) % 7));
}

/** The seven dates of the workweek that begins on `startsOn`. */
export function daysOfWeek(startsOn: DateText): DateText[] {
  return [0, 1, 2, 3, 4, 5, 6].map((days) => addDays(startsOn, days));
}

function at(instant: string, zone: string): DateTime<true> {
  const moment = DateTime.fromISO(instant, { zone });
  if (!moment.isValid) throw new RangeError(`not an instant in a known zone: ${instant}, ${zone}`);
  return moment;
}

function utc(date: DateText): DateTime<true> {
  const day = DateTime.fromISO(date, { zone: 'utc' });
  if (!day.isValid) throw new RangeError(`not a date: ${date}`);
  return day;
}
