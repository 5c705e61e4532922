import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import type { PriceList } from './price-list.js';
import type { SubscriptionSync } from './subscription-sync.js';

/** What the services of the slice work with. */
export type SubscriptionParts = {
  payments: Payments;
  work: UnitOfWork;
  /** Where our screens are, for the way back from the provider's pages. */
  origin: string;
  prices: PriceList;
  sync: SubscriptionSync;
};
