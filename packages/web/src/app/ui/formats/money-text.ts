import { formatAmount, formatDifference, formatMoney } from '@bookmatch/common/money/format';
import type { Cents } from '@bookmatch/common/money/cents';

/**
 * How an amount is written: `exact` $1,250.00 · `whole` $1,250, for reading at a glance · `bare` 1,250.00, where the
 * table says the currency once · `difference` +$108.00.
 */
export type MoneyStyle = 'exact' | 'whole' | 'bare' | 'difference';

export function moneyText(cents: Cents, currency: string, style: MoneyStyle = 'exact'): string {
  switch (style) {
    case 'exact':
      return formatMoney(cents, currency);
    case 'whole':
      return formatMoney(wholeDollars(cents), currency).replace(/\.00$/, '');
    case 'bare':
      return formatAmount(cents);
    case 'difference':
      return formatDifference(cents, currency);
  }
}

/** Half away from zero, as everywhere. */
function wholeDollars(cents: Cents): Cents {
  return Math.sign(cents) * Math.round(Math.abs(cents) / 100) * 100;
}
