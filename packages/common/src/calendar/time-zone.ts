import * as z from 'zod';

/** Whether this is the name of a zone in the IANA time zone database that this machine knows. */
export function isTimeZone(zone: string): boolean {
  if (!/^[A-Za-z][A-Za-z0-9_+-]*(\/[A-Za-z0-9_+-]+)*$/.test(zone)) return false;
  try {
    return new Intl.DateTimeFormat('en-US', { timeZone: zone }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
}

export const timeZoneSchema = z.string().max(60).refine(isTimeZone, 'Choose a time zone from the list.');
