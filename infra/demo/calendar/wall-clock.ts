import type { DateText } from '@bookmatch/common/calendar/shop-dates';
import { instantOnWall } from '@bookmatch/common/time/wall-time';

/** Minutes after midnight on the wall of the shop. */
export type WallMinute = number;

export const atHour = (hours: number, minutes = 0): WallMinute => hours * 60 + minutes;

/** The instant at which the clock on the shop's wall shows that date and minute. */
export function instantAt(zone: string, date: DateText, minute: WallMinute): Date {
  const two = (value: number) => String(value).padStart(2, '0');
  const instant = instantOnWall(zone, date, `${two(Math.floor(minute / 60))}:${two(minute % 60)}`);
  if (instant === null) throw new RangeError(`There is no minute ${minute} on ${date}.`);
  return new Date(instant);
}
