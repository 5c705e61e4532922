import type { BillingStagePlan } from '../estimates/billing-schedule-contract.js';

/** What a shop bills by until it says otherwise. Common practice, no source. */
export const DEFAULT_BILLING_SCHEDULE: readonly BillingStagePlan[] = [
  { name: 'Deposit', share: { percent: '40' }, deposit: true, due: 'on-acceptance' },
  { name: 'Ready to finish', share: { percent: '40' }, deposit: false, due: 'by-hand' },
  { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' },
];

/** The settings of a new shop that its owner was not asked for at sign-up. */
export const NEW_SHOP = {
  currency: 'USD',
  defaultTaxRate: '0',
  taxRule: 'on-price',
  estimateTerms: '',
  estimateValidDays: 30,
  invoiceDueDays: 14,
} as const;
