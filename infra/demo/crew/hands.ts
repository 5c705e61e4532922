import type { JobOperation } from '../catalog/operations.js';

export const HANDS = ['lead-hand', 'bench-hand', 'finisher'] as const;
export type Hand = (typeof HANDS)[number];

/** What each likes to do first. What is missing somebody does only when nothing else is left to do. */
export const LIKES: Record<Hand, readonly JobOperation[]> = {
  'lead-hand': [
    'Measure and draw',
    'Install',
    'Doors and drawers',
    'Mill solid stock',
    'Face frames',
    'Deliver',
  ],
  'bench-hand': [
    'Cut sheet goods',
    'Assemble boxes',
    'Face frames',
    'Install',
    'Deliver',
    'Mill solid stock',
  ],
  finisher: [
    'Finish',
    'Sand and prime',
    'Doors and drawers',
    'Assemble boxes',
    'Mill solid stock',
    'Deliver',
  ],
};

/** Working days away, by their numbers: a week in summer, a few days around it. */
export const DAYS_OFF: Record<Hand, readonly (readonly [number, number])[]> = {
  'lead-hand': [
    [-206, -204],
    [-121, -117],
    [-33, -33],
  ],
  'bench-hand': [
    [-171, -171],
    [-98, -92],
    [-48, -47],
  ],
  finisher: [
    [-226, -226],
    [-150, -144],
    [-66, -65],
    [-27, -27],
  ],
};

export function isOff(hand: Hand, day: number): boolean {
  return DAYS_OFF[hand].some(([from, to]) => day >= from && day <= to);
}
