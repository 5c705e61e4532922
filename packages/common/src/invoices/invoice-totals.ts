import { applyRate, extend, sumCents, type Cents } from '../money/cents.js';
import type { InvoiceLine } from './invoices-contract.js';

export type InvoiceTotals = { netCents: Cents; taxCents: Cents; totalCents: Cents };
export type PricedInvoiceLine = InvoiceLine & { amountCents: Cents };

export function priceInvoiceLines(lines: readonly InvoiceLine[]): PricedInvoiceLine[] {
  return lines.map((line) => ({ ...line, amountCents: extend(line.quantity, line.unitPriceCents) }));
}

/** What a free invoice comes to: tax once on the sum of its taxable lines (the invoice basis of SSUTA section 324). */
export function invoiceTotals(lines: readonly InvoiceLine[], taxRate: string): InvoiceTotals {
  const priced = priceInvoiceLines(lines);
  const netCents = sumCents(priced.map((line) => line.amountCents));
  const taxable = priced.filter((line) => line.taxable).map((line) => line.amountCents);
  const taxCents = applyRate(sumCents(taxable), taxRate);
  return { netCents, taxCents, totalCents: netCents + taxCents };
}

/** What keeps a draft from being issued, as sentences; empty when nothing does. */
export function issueRefusals(lines: readonly InvoiceLine[], totals: InvoiceTotals): string[] {
  const refusals: [boolean, string][] = [
    [lines.length === 0, 'Add a line: there is nothing to bill yet.'],
    [lines.length > 0 && totals.totalCents <= 0, 'An invoice must come to more than zero.'],
    [totals.netCents < 0 || totals.taxCents < 0, 'What is taken off is more than what is billed.'],
  ];
  return refusals.filter(([holds]) => holds).map(([, sentence]) => sentence);
}
