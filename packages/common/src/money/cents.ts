import { Decimal } from 'decimal.js';

/** Money is whole cents in a safe integer everywhere between the edges. */
export type Cents = number;

/** A rate as an exact decimal in text: `"0.0825"` is 8.25 %. Never a binary float. */
export type Rate = string;

/** The largest amount any field takes: 99,999,999.99, so that sums of thousands of rows stay safe integers. */
export const MAX_CENTS: Cents = 9_999_999_999;

/** The largest price of one document, $40 million: even doubled by tax it stays within MAX_CENTS. */
export const MAX_PRICE_CENTS: Cents = 4_000_000_000;

/** Rounds half away from zero, the rule of US sales tax statutes (SSUTA section 324) applied to both signs. */
export function roundHalfUp(value: Decimal): number {
  return value.toDecimalPlaces(0, Decimal.ROUND_HALF_UP).toNumber();
}

/** `cents × rate`, rounded half-up to the cent. */
export function applyRate(cents: Cents, rate: Rate): Cents {
  return roundHalfUp(new Decimal(cents).times(rate));
}

/** `quantity × unit price`, rounded half-up to the cent. Quantity is an exact decimal in text. */
export function extend(quantity: string, unitCents: Cents): Cents {
  return roundHalfUp(new Decimal(quantity).times(unitCents));
}

export function sumCents(amounts: readonly Cents[]): Cents {
  return amounts.reduce((total, amount) => total + amount, 0);
}
