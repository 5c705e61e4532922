import type { Endpoint } from './webhooks/endpoint.js';

/** A recurring price that exists from the start, since our product names its price by configuration. */
export interface PriceSeed {
  id: string;
  productName: string;
  /** Integer cents a unit a period. */
  unitAmountCents: number;
  currency: string;
  interval: 'month' | 'year';
}

export interface PaymentsFakeOptions {
  /** 0 takes any free port. */
  port?: number;
  host?: string;
  /** The only secret key the server takes. */
  key?: string;
  /** Where a browser reaches the hosted pages; the listening address unless given. */
  publicUrl?: string;
  webhooks?: Endpoint[];
  /** JSON file that keeps the state over a restart; memory only unless given. */
  stateFile?: string;
  prices?: PriceSeed[];
  /** Wait before the first retry of a webhook, in milliseconds; it doubles each time. */
  retryBaseMs?: number;
}

export const DEFAULT_KEY = 'sk_test_bookmatch';

export const DEFAULT_PRICES: readonly PriceSeed[] = [
  {
    id: 'price_bookmatch_member_month',
    productName: 'Bookmatch, one active member a month',
    unitAmountCents: 2900,
    currency: 'usd',
    interval: 'month',
  },
];
