import { Fraction } from 'fraction.js';

/** Exact; the inch is 25.4 mm by definition (international yard and pound agreement of 1959). */
export const MM_PER_INCH = new Fraction(254, 10);
export const INCHES_PER_FOOT = 12;
/** Nothing a shop builds is longer than 100 m. */
export const MAX_LENGTH_MM = 100_000;

/** Exact millimeters as the decimal text that is stored, to a thousandth, half up. */
export function storedMillimeters(millimeters: Fraction): string {
  const thousandths = millimeters.mul(1000).add(1, 2).floor();
  return thousandths.div(1000).toString(3);
}
