import type { Generator } from '../chance/generator.js';
import { atHour, type WallMinute } from '../calendar/wall-clock.js';

/** The bounds of a working day: begin, the switch in the morning, lunch, the switch after it, clean-up, end. */
export type DayFrame = {
  pieces: { from: WallMinute; to: WallMinute; use: 'work' | 'meal' | 'shop' }[];
};

/** Seven to half past three or so, with half an hour for lunch and often a quarter of an hour for the broom. */
export function dayFrame(random: Generator): DayFrame {
  const begin = atHour(7) + random.whole(-6, 8);
  const lunch = atHour(11, 45) + random.whole(-10, 25);
  const back = lunch + random.whole(29, 36);
  const end = atHour(15, 40) + random.whole(-12, 40);
  const cleanUp = random.chance(0.55) ? end - random.whole(12, 24) : end;
  const bounds: [WallMinute, WallMinute, 'work' | 'meal' | 'shop'][] = [
    ...split(begin, lunch, random.chance(0.9) ? atHour(9, 20) + random.whole(-35, 45) : null),
    [lunch, back, 'meal'],
    ...split(back, cleanUp, random.chance(0.68) ? atHour(13, 50) + random.whole(-30, 30) : null),
    [cleanUp, end, 'shop'],
  ];
  return { pieces: bounds.filter(([from, to]) => to > from).map(([from, to, use]) => ({ from, to, use })) };
}

function split(from: WallMinute, to: WallMinute, at: WallMinute | null): [WallMinute, WallMinute, 'work'][] {
  if (at === null) return [[from, to, 'work']];
  return [
    [from, at, 'work'],
    [at, to, 'work'],
  ];
}
