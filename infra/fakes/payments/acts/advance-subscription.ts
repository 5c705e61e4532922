import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { changeSubscription, endSubscription } from './change-subscription.js';
import { collect } from './invoicing.js';
import { openInvoices, payOpenInvoices, renew } from './renew.js';

export const STEPS = [
  'trial_will_end',
  'trial_end',
  'renew',
  'past_due',
  'unpaid',
  'paused',
  'resumed',
  'recovered',
  'canceled',
] as const;

/** Where a test takes a subscription: the way there is the one real time would take, events included. */
export type Step = (typeof STEPS)[number];

const WAYS: Record<Step, (desk: Desk, subscription: Stripe.Subscription) => void> = {
  trial_will_end: (desk, subscription) => desk.publish('customer.subscription.trial_will_end', subscription),
  trial_end: (desk, subscription) => renew(desk, subscription),
  renew: (desk, subscription) => renew(desk, subscription),
  past_due: becomePastDue,
  unpaid: becomeUnpaid,
  paused: pause,
  resumed: resume,
  recovered: (desk, subscription) => void payOpenInvoices(desk, subscription),
  canceled: (desk, subscription) => endSubscription(desk, subscription, 'payment_failed'),
};

export function advanceSubscription(desk: Desk, subscription: Stripe.Subscription, step: Step): void {
  WAYS[step](desk, subscription);
}

function becomePastDue(desk: Desk, subscription: Stripe.Subscription): void {
  if (subscription.status !== 'past_due') renew(desk, subscription, { forceDecline: true });
}

/** The last retry fails, and no further one is planned. */
function becomeUnpaid(desk: Desk, subscription: Stripe.Subscription): void {
  becomePastDue(desk, subscription);
  changeSubscription(desk, subscription, () => {
    for (const invoice of openInvoices(desk, subscription)) {
      collect(desk, subscription, invoice, { cardPresent: false, forceDecline: true, nextAttempt: null });
    }
    subscription.status = 'unpaid';
  });
}

/** As a trial that ended without a card. */
function pause(desk: Desk, subscription: Stripe.Subscription): void {
  changeSubscription(desk, subscription, () => {
    subscription.status = 'paused';
  });
  desk.publish('customer.subscription.paused', subscription);
}

function resume(desk: Desk, subscription: Stripe.Subscription): void {
  changeSubscription(desk, subscription, () => {
    subscription.status = 'active';
  });
  desk.publish('customer.subscription.resumed', subscription);
}
