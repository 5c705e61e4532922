import Stripe from 'stripe';

export interface PriceSource {
  id: string;
  product: string;
  /** Integer cents. */
  unitAmountCents: number;
  currency: string;
  /** Null for a price paid once. */
  interval: 'month' | 'year' | null;
  active?: boolean;
  now: number;
}

export function buildPrice(from: PriceSource): Stripe.Price {
  return {
    id: from.id,
    object: 'price',
    active: from.active ?? true,
    billing_scheme: 'per_unit',
    created: from.now,
    currency: from.currency,
    custom_unit_amount: null,
    livemode: false,
    lookup_key: null,
    metadata: {},
    nickname: null,
    product: from.product,
    recurring: from.interval === null ? null : recurring(from.interval),
    tax_behavior: 'unspecified',
    tiers_mode: null,
    transform_quantity: null,
    type: from.interval === null ? 'one_time' : 'recurring',
    unit_amount: from.unitAmountCents,
    unit_amount_decimal: Stripe.Decimal.from(from.unitAmountCents),
  };
}

function recurring(interval: 'month' | 'year'): Stripe.Price.Recurring {
  return { interval, interval_count: 1, meter: null, trial_period_days: null, usage_type: 'licensed' };
}
