import Stripe from 'stripe';

/** The older form of a recurring price, which subscription items still carry. */
export function buildPlan(price: Stripe.Price): Stripe.Plan {
  return {
    id: price.id,
    object: 'plan',
    active: price.active,
    amount: price.unit_amount,
    amount_decimal: Stripe.Decimal.from(price.unit_amount ?? 0),
    billing_scheme: 'per_unit',
    created: price.created,
    currency: price.currency,
    interval: price.recurring?.interval ?? 'month',
    interval_count: price.recurring?.interval_count ?? 1,
    livemode: false,
    metadata: {},
    meter: null,
    nickname: null,
    product: price.product,
    tiers_mode: null,
    transform_usage: null,
    trial_period_days: null,
    usage_type: 'licensed',
  };
}
