import { formatMoney, formatRate } from '../money/format.js';
import type { AcceptedDocument } from './accepted-document-contract.js';

/** How an estimate speaks of its sales tax: the row it has among the totals, if any, and the sentence below them. */
export function taxWords({
  taxRule,
  taxRate,
  taxableCents,
  currency,
}: Pick<AcceptedDocument, 'taxRule' | 'taxRate' | 'taxableCents' | 'currency'>): {
  label: string | null;
  note: string;
} {
  if (taxRule === 'exempt')
    return { label: null, note: 'No sales tax is added: an exemption certificate is on file.' };
  if (taxRule === 'shop-pays-use-tax')
    return { label: null, note: 'No sales tax is added: the shop pays the tax on its materials itself.' };
  return {
    label: `Sales tax ${formatRate(taxRate)}`,
    note: `Sales tax is computed once, on ${formatMoney(taxableCents, currency)} of taxable work.`,
  };
}

/** When a stage of the billing schedule is billed, as its customer reads it. */
export const BILLING_DUE_WORDS = {
  'on-acceptance': 'On acceptance',
  'by-hand': 'When the stage is reached',
} as const;
