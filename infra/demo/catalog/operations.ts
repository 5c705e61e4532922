import type { TimeCategory } from '@bookmatch/common/estimates/cost-categories';

/** The operations a new shop starts with (common/shops/default-operations), by name, as the catalog plans them. */
export const JOB_OPERATIONS = [
  'Measure and draw',
  'Cut sheet goods',
  'Mill solid stock',
  'Face frames',
  'Assemble boxes',
  'Doors and drawers',
  'Sand and prime',
  'Finish',
  'Deliver',
  'Install',
] as const;
export type JobOperation = (typeof JOB_OPERATIONS)[number];
export const OFF_JOB_OPERATION = 'Shop, not on a job';

/** What an hour is planned to cost and sold at, in cents. */
export type OperationRate = { category: TimeCategory; costCents: number; priceCents: number };
const SHOP: OperationRate = { category: 'labor', costCents: 4000, priceCents: 8600 };
const FINISHING: OperationRate = { category: 'finishing', costCents: 3700, priceCents: 8800 };

export const OPERATION_RATES: Record<JobOperation, OperationRate> = {
  'Measure and draw': { ...SHOP, costCents: 4600, priceCents: 9200 },
  'Cut sheet goods': SHOP,
  'Mill solid stock': SHOP,
  'Face frames': SHOP,
  'Assemble boxes': SHOP,
  'Doors and drawers': SHOP,
  'Sand and prime': FINISHING,
  Finish: FINISHING,
  Deliver: { category: 'delivery', costCents: 3900, priceCents: 7800 },
  Install: { category: 'install', costCents: 4200, priceCents: 9400 },
};
