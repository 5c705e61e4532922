import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { periodEndOf } from './cancel-at-period-end.js';
import { expireSession } from './complete-session.js';
import { renew } from './renew.js';

const WARNING_SECONDS = 3 * 24 * 60 * 60;
/** Those that live on by the clock; unpaid, paused and ended ones stand still. */
const RUNNING: readonly Stripe.Subscription.Status[] = ['active', 'trialing', 'past_due'];

/** Does what time alone brings about: sessions expire, trials end, periods renew. */
export function sweep(desk: Desk): void {
  for (const { session } of Object.values(desk.book.sessions)) {
    if (session.status === 'open' && session.expires_at <= desk.now()) expireSession(desk, session);
  }
  for (const subscription of Object.values(desk.book.subscriptions)) {
    if (RUNNING.includes(subscription.status)) sweepSubscription(desk, subscription);
  }
}

function sweepSubscription(desk: Desk, subscription: Stripe.Subscription): void {
  warnOfTrialEnd(desk, subscription);
  while (RUNNING.includes(subscription.status) && periodEndOf(subscription) <= desk.now()) {
    renew(desk, subscription);
  }
}

function warnOfTrialEnd(desk: Desk, subscription: Stripe.Subscription): void {
  if (subscription.status !== 'trialing' || subscription.trial_end === null) return;
  if (subscription.trial_end - desk.now() > WARNING_SECONDS) return;
  if (desk.book.trialWarned[subscription.id] === true) return;
  desk.book.trialWarned[subscription.id] = true;
  desk.publish('customer.subscription.trial_will_end', subscription);
}
