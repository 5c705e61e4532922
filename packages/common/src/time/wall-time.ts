import { DateTime } from 'luxon';
import type { DateText, InstantText } from '../calendar/shop-dates.js';

/** A time of day on the wall of the shop, `HH:mm` in 24 hours, as the browser's time field gives it. */
export type WallTime = string;

/**
 * The instant at which the clock on the shop's wall shows a date and a time. In the hour that the clocks skip in spring
 * it is the instant an hour later on the wall; of the hour they repeat in fall, the first.
 *
 * @returns null when it is no date or no time
 */
export function instantOnWall(zone: string, on: DateText, at: WallTime): InstantText | null {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(on) || !/^\d{2}:\d{2}$/.test(at)) return null;
  const moment = DateTime.fromISO(`${on}T${at}`, { zone });
  if (!moment.isValid) return null;
  const [first = moment] = moment.getPossibleOffsets().sort((a, b) => a.toMillis() - b.toMillis());
  return first.toUTC().toISO();
}

/** What the clock on the shop's wall shows at an instant, `HH:mm`. */
export function wallTime(zone: string, instant: InstantText): WallTime {
  return DateTime.fromISO(instant, { zone }).toFormat('HH:mm');
}
