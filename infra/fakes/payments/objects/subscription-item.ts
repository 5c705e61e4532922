import type Stripe from 'stripe';
import { newId } from '../ids.js';
import { buildPlan } from './plan.js';

export function buildSubscriptionItem(from: {
  subscription: string;
  price: Stripe.Price;
  quantity: number;
  periodStart: number;
  periodEnd: number;
  now: number;
}): Stripe.SubscriptionItem {
  return {
    id: newId('si_', 14),
    object: 'subscription_item',
    billing_thresholds: null,
    created: from.now,
    current_period_end: from.periodEnd,
    current_period_start: from.periodStart,
    current_trial: null,
    discounts: [],
    metadata: {},
    plan: buildPlan(from.price),
    price: from.price,
    quantity: from.quantity,
    subscription: from.subscription,
    tax_rates: [],
  };
}
