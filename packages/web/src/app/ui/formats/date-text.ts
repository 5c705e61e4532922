export type DateStyle = 'day' | 'day-and-time' | 'time';

const ONLY_A_DATE = /^\d{4}-\d{2}-\d{2}$/;

/**
 * `Thu, Jan 14`, with the year when it is not the present one; `9:31 am` for a time.
 *
 * @param value a date `YYYY-MM-DD`, which has no zone, or an instant in UTC, shown in the zone
 * @param now the present instant, for telling whether the year goes without saying
 */
export function dateText(value: string, zone: string, style: DateStyle, now: Date): string {
  const plain = ONLY_A_DATE.test(value);
  const timeZone = plain ? 'UTC' : zone;
  const instant = new Date(plain ? `${value}T00:00:00Z` : value);
  const time = timeOf(instant, timeZone);
  if (style === 'time') return time;
  const day = dayOf(instant, timeZone, yearIn(now, zone) === yearIn(instant, timeZone));
  return style === 'day' ? day : `${day}, ${time}`;
}

function dayOf(instant: Date, timeZone: string, thisYear: boolean): string {
  return new Intl.DateTimeFormat('en-US', {
    timeZone,
    weekday: 'short',
    month: 'short',
    day: 'numeric',
    year: thisYear ? undefined : 'numeric',
  }).format(instant);
}

function timeOf(instant: Date, timeZone: string): string {
  return new Intl.DateTimeFormat('en-US', { timeZone, hour: 'numeric', minute: '2-digit' })
    .format(instant)
    .replace(/\s*([AP])M$/, (_, half: string) => ` ${half.toLowerCase()}m`);
}

const yearIn = (instant: Date, timeZone: string): string =>
  new Intl.DateTimeFormat('en-US', { timeZone, year: 'numeric' }).format(instant);
