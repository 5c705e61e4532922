import type { DateText } from '../calendar/shop-dates.js';
import type { Cents } from '../money/cents.js';
import { splitCents } from '../money/split.js';
import { splitByDay, type Stretch } from './shop-week.js';

export type CostedStretch = Stretch & { costCents: Cents };
export type CostedPart = { on: DateText; minutes: number; costCents: Cents };

/**
 * A closed entry cut at the midnights of the shop's zone it runs across, its cost shared by the minutes of each part, so
 * that the days of a week, and two weeks that share a shift, add up to the cent.
 */
export function costedParts(stretch: CostedStretch, zone: string): CostedPart[] {
  const parts = splitByDay(stretch.startedAt, stretch.endedAt, zone);
  const minutes = parts.map((part) => part.minutes);
  const costs = minutes.some((part) => part > 0) ? splitCents(stretch.costCents, minutes) : [];
  return parts.map((part, index) => ({ ...part, costCents: costs[index] ?? 0 }));
}
