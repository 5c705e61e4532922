import type Stripe from 'stripe';
import type { Desk } from '../desk.js';

type Watched = Pick<
  Stripe.Subscription,
  | 'status'
  | 'cancel_at'
  | 'cancel_at_period_end'
  | 'canceled_at'
  | 'default_payment_method'
  | 'latest_invoice'
  | 'metadata'
  | 'trial_end'
> & { items: Stripe.ApiList<Stripe.SubscriptionItem> };

function watched(subscription: Stripe.Subscription): Watched {
  const { status, cancel_at, cancel_at_period_end, canceled_at, default_payment_method } = subscription;
  const { latest_invoice, metadata, trial_end, items } = subscription;
  const view = { status, cancel_at, cancel_at_period_end, canceled_at, default_payment_method };
  return JSON.parse(JSON.stringify({ ...view, latest_invoice, metadata, trial_end, items })) as Watched;
}

/** Makes a change and, when it changed anything, publishes the subscription with the old values of just that. */
export function changeSubscription(desk: Desk, subscription: Stripe.Subscription, change: () => void): void {
  const before = watched(subscription);
  change();
  const after = watched(subscription);
  const names = Object.keys(before) as (keyof Watched)[];
  const changed = names.filter((name) => JSON.stringify(before[name]) !== JSON.stringify(after[name]));
  if (changed.length === 0) return;
  const previous = Object.fromEntries(changed.map((name) => [name, before[name]]));
  desk.publish('customer.subscription.updated', subscription, previous);
}

/** Ends a subscription for good. */
export function endSubscription(
  desk: Desk,
  subscription: Stripe.Subscription,
  reason: 'cancellation_requested' | 'payment_failed',
): void {
  const now = desk.now();
  subscription.status = 'canceled';
  subscription.canceled_at = subscription.canceled_at ?? now;
  subscription.ended_at = now;
  subscription.cancellation_details = { comment: null, feedback: null, feedback_option: null, reason };
  delete desk.book.waitingLines[subscription.id];
  desk.publish('customer.subscription.deleted', subscription);
}
