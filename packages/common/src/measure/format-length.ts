import { Fraction } from 'fraction.js';
import { MM_PER_INCH } from './length.js';
import type { UnitSystem } from './unit-system.js';

export type ShownLength = {
  text: string;
  /** False when what is shown is not the length itself but the nearest mark on the rule. */
  exact: boolean;
};

/** Lengths are stored to a thousandth of a millimeter, so what is closer than half of that is the same length. */
const STORED_HALF_STEP = new Fraction(5, 10_000);
export type InchMark = 16 | 32 | 64;

/**
 * A length in the shop's unit: `23 5/8"` to the nearest mark, `600 mm` to a tenth.
 *
 * @param millimeters exact, or the decimal text that is stored
 * @param mark the finest division of the inch shown
 */
export function formatLength(
  millimeters: Fraction | string,
  system: UnitSystem,
  mark: InchMark = 64,
): ShownLength {
  const exact = new Fraction(millimeters);
  return system === 'inch' ? inInches(exact, mark) : inMillimeters(exact);
}

function inInches(millimeters: Fraction, mark: InchMark): ShownLength {
  const shown = nearest(millimeters.div(MM_PER_INCH), mark);
  return { text: `${shown.toFraction(true)}"`, exact: isSame(shown.mul(MM_PER_INCH), millimeters) };
}

function inMillimeters(millimeters: Fraction): ShownLength {
  const shown = nearest(millimeters, 10);
  return { text: `${shown.toString(1)} mm`, exact: isSame(shown, millimeters) };
}

function nearest(value: Fraction, parts: number): Fraction {
  return value.mul(parts).add(1, 2).floor().div(parts);
}

function isSame(shown: Fraction, millimeters: Fraction): boolean {
  return shown.sub(millimeters).abs().lte(STORED_HALF_STEP);
}
