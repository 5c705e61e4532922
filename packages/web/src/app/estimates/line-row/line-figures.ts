import { extend, applyRate, type Cents } from '@bookmatch/common/money/cents';
import { percentToRate } from '@bookmatch/common/money/percent';
import type { LineFields } from '../draft/draft-form';

export type LineFigures = { amountCents: Cents; costCents: Cents };

/** What a line comes to while it is typed: a quantity that cannot be read yet counts nothing. */
export function lineFigures(line: LineFields | undefined): LineFigures {
  const quantity = line && /^\d{1,9}(\.\d{1,3})?$/.test(line.quantity) ? line.quantity : '0';
  return {
    amountCents: extend(quantity, line?.unitPriceCents ?? 0),
    costCents: extend(quantity, line?.unitCostCents ?? 0),
  };
}

/** Cost and a markup in percent, `40`, make a price, half-up to the cent; null for what is no percent. */
export function priceAtMarkup(costCents: Cents, percent: string): Cents | null {
  const reading = percentToRate(percent);
  return 'problem' in reading ? null : costCents + applyRate(costCents, reading.rate);
}
