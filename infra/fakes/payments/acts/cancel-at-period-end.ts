import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { changeSubscription } from './change-subscription.js';

export function periodEndOf(subscription: Stripe.Subscription): number {
  return Math.max(...subscription.items.data.map((item) => item.current_period_end));
}

/** Lets a subscription run out, or takes that back. */
export function setCancelAtPeriodEnd(desk: Desk, subscription: Stripe.Subscription, cancel: boolean): void {
  changeSubscription(desk, subscription, () => markCancelAtPeriodEnd(desk, subscription, cancel));
}

/** The same without an event of its own, for a change that publishes more at once. */
export function markCancelAtPeriodEnd(desk: Desk, subscription: Stripe.Subscription, cancel: boolean): void {
  if (subscription.cancel_at_period_end === cancel) return;
  subscription.cancel_at_period_end = cancel;
  subscription.cancel_at = cancel ? periodEndOf(subscription) : null;
  subscription.canceled_at = cancel ? desk.now() : null;
  const reason = cancel ? 'cancellation_requested' : null;
  subscription.cancellation_details = { comment: null, feedback: null, feedback_option: null, reason };
}
