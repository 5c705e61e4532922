import { DateTime } from 'luxon';
import type { DateText, InstantText } from './shop-dates.js';

const MINUS = '\u2212';

/** `Thu, Jan 14`; with the year when it is not the year of `today`: `Thu, Jan 14, 2027`. */
export function formatDate(date: DateText, today?: DateText): string {
  const sameYear = today !== undefined && today.slice(0, 4) === date.slice(0, 4);
  return american(DateTime.fromISO(date, { zone: 'utc' })).toFormat(
    sameYear ? 'ccc, LLL d' : 'ccc, LLL d, yyyy',
  );
}

/** `9:31 am`, on the wall of the shop. */
export function formatTime(instant: InstantText, zone: string): string {
  return american(DateTime.fromISO(instant, { zone })).toFormat('h:mm a').toLowerCase();
}

/** `Thu, Jan 14, 9:31 am`, on the wall of the shop. */
export function formatInstant(instant: InstantText, zone: string, today?: DateText): string {
  const date = DateTime.fromISO(instant, { zone }).toFormat('yyyy-MM-dd');
  return `${formatDate(date, today)}, ${formatTime(instant, zone)}`;
}

/** `2 h 14 m`, `45 m`, `3 h`; below zero with a true minus. */
export function formatDuration(minutes: number): string {
  const whole = Math.abs(Math.trunc(minutes));
  const hours = Math.floor(whole / 60);
  const rest = whole % 60;
  const parts = [hours > 0 ? `${hours} h` : '', rest > 0 || hours === 0 ? `${rest} m` : ''];
  return sign(minutes) + parts.filter(Boolean).join(' ');
}

/** `7.5 h`: hours to one decimal, for tables of planned and clocked time; half up, away from zero. */
export function formatHours(minutes: number): string {
  const tenths = Math.round(Math.abs(minutes) / 6);
  return `${tenths === 0 ? '' : sign(minutes)}${(tenths / 10).toFixed(1)} h`;
}

function sign(minutes: number): string {
  return Math.trunc(minutes) < 0 ? MINUS : '';
}

function american(moment: DateTime): DateTime {
  return moment.setLocale('en-US');
}
