import type { InstantText } from '../calendar/shop-dates.js';

const MINUTE_MS = 60_000;

/**
 * A punch is kept to the minute it falls in, the start and the end alike. Both ends are cut the same way, so over time
 * it favors nobody (29 CFR 785.48(b)), and every duration is whole minutes from here on.
 */
export function punchMinute(at: InstantText): InstantText {
  return new Date(Math.floor(Date.parse(at) / MINUTE_MS) * MINUTE_MS).toISOString();
}

/** Whole minutes that passed between two instants, whatever the clock on the wall did meanwhile. */
export function elapsedMinutes(startedAt: InstantText, endedAt: InstantText): number {
  return Math.floor((Date.parse(endedAt) - Date.parse(startedAt)) / MINUTE_MS);
}
