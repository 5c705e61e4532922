/** `1.5` hours are `"90"` minutes: exact, with at most three decimals, or null for what is no number of hours. */
export function hoursToMinutes(hours: string): string | null {
  const match = /^(\d{1,5})?(?:\.(\d{1,4}))?$/.exec(hours.trim());
  if (!match || (match[1] === undefined && match[2] === undefined)) return null;
  const tenThousandths = Number(`${match[1] ?? '0'}${(match[2] ?? '').padEnd(4, '0')}`);
  return plain(Math.round((tenThousandths * 60) / 10) / 1000);
}

/** `"90"` minutes are `1.5` hours, to four decimals. */
export function minutesToHours(minutes: string): string {
  return plain(Math.round((Number(minutes) / 60) * 10_000) / 10_000);
}

const plain = (value: number): string => String(value);
