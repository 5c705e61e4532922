import { Decimal } from 'decimal.js';
import type { Cents } from './cents.js';

/** `part ÷ whole` as a decimal in text to four places, rounded half-up: `"0.4286"`. Null when the whole is zero. */
export function ratio(part: Cents, whole: Cents): string | null {
  if (whole === 0) return null;
  return new Decimal(part).div(whole).toDecimalPlaces(4, Decimal.ROUND_HALF_UP).toFixed();
}
