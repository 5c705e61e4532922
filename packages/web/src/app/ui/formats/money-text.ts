import type { Cents } from '@bookmatch/common/money/cents';

const MINUS = '\u2212';
const dollars = new Intl.NumberFormat('en-US', { style: 'currency', currency: 'USD' });
const wholeDollars = new Intl.NumberFormat('en-US', {
  style: 'currency',
  currency: 'USD',
  maximumFractionDigits: 0,
});
const bare = new Intl.NumberFormat('en-US', { minimumFractionDigits: 2, maximumFractionDigits: 2 });

/**
 * How an amount is written: `exact` $1,250.00 · `whole` $1,250, for reading at a glance · `bare` 1,250.00, where the
 * table says the currency once · `signed` +$108.00, for a difference.
 */
export type MoneyStyle = 'exact' | 'whole' | 'bare' | 'signed' | 'signed-whole';

/** @param cents whole cents; negative gets a true minus, never a hyphen */
export function moneyText(cents: Cents, style: MoneyStyle = 'exact'): string {
  const amount = unsigned(Math.abs(cents) / 100, style);
  if (cents < 0) return MINUS + amount;
  return style.startsWith('signed') && cents > 0 ? `+${amount}` : amount;
}

function unsigned(amount: number, style: MoneyStyle): string {
  if (style === 'bare') return bare.format(amount);
  return (style === 'whole' || style === 'signed-whole' ? wholeDollars : dollars).format(amount);
}
