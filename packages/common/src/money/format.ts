import type { Cents } from './cents.js';

/** The typographic minus: a hyphen is too short to be seen beside figures. */
export const MINUS = '\u2212';

/** `$1,250.00`, `−$5.00` with a true minus; `0` is never negative. */
export function formatMoney(cents: Cents, currency: string): string {
  return format(cents, { style: 'currency', currency });
}

/** `1,250.00`, for tables that name the currency once in their head. */
export function formatAmount(cents: Cents): string {
  return format(cents, { minimumFractionDigits: 2, maximumFractionDigits: 2 });
}

/** A difference with its sign always shown: `+$108.00`, `−$7.00`, `$0.00`. */
export function formatDifference(cents: Cents, currency: string): string {
  return `${cents > 0 ? '+' : ''}${formatMoney(cents, currency)}`;
}

/** A decimal fraction in text as a percent: `"0.0825"` is `8.25%`. */
export function formatRate(rate: string, maximumFractionDigits = 4): string {
  const text = new Intl.NumberFormat('en-US', { style: 'percent', maximumFractionDigits }).format(
    Number(rate),
  );
  return text.replace('-', MINUS);
}

function format(cents: Cents, options: Intl.NumberFormatOptions): string {
  // Cents are a safe integer and two decimals are shown, so the division loses nothing that is seen.
  const text = new Intl.NumberFormat('en-US', options).format(Math.abs(cents) / 100);
  return cents < 0 ? `${MINUS}${text}` : text;
}
