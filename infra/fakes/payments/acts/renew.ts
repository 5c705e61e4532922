import type Stripe from 'stripe';
import { nextPeriodEnd } from '../calendar.js';
import type { Desk } from '../desk.js';
import { periodEndOf } from './cancel-at-period-end.js';
import { changeSubscription, endSubscription } from './change-subscription.js';
import { billSubscription, collect, stepMonths, type CollectOptions } from './invoicing.js';

export interface RenewOptions {
  /** Declined whatever the card. */
  forceDecline?: boolean;
}

/**
 * Begins the next period: ends the trial or the paid period, bills and tries to collect. A subscription that was
 * to end at its period's end ends instead.
 */
export function renew(desk: Desk, subscription: Stripe.Subscription, options: RenewOptions = {}): void {
  if (subscription.cancel_at_period_end) {
    endSubscription(desk, subscription, 'cancellation_requested');
    return;
  }
  changeSubscription(desk, subscription, () => {
    beginPeriod(desk, subscription);
    const invoice = billSubscription(desk, subscription, 'subscription_cycle');
    const paid = collect(desk, subscription, invoice, collectOptions(desk, subscription, options));
    subscription.status = paid ? statusOncePaid(desk, subscription) : statusOnceFailed(subscription);
  });
}

/** A trial that is cut short is billed from now on; a period begins where the last one ended. */
function beginPeriod(desk: Desk, subscription: Stripe.Subscription): void {
  const start = Math.min(periodEndOf(subscription), Math.max(desk.now(), subscription.created + 1));
  const fromTrial = subscription.status === 'trialing';
  const begin = fromTrial ? start : periodEndOf(subscription);
  if (fromTrial) {
    subscription.trial_end = begin;
    subscription.billing_cycle_anchor = begin;
    subscription.status = 'active';
  }
  for (const item of subscription.items.data) {
    item.current_period_start = begin;
    item.current_period_end = nextPeriodEnd(subscription.billing_cycle_anchor, begin, stepMonths(item.price));
  }
}

function collectOptions(
  desk: Desk,
  subscription: Stripe.Subscription,
  options: RenewOptions,
): CollectOptions {
  const marked = desk.book.failNext[subscription.id] === true;
  delete desk.book.failNext[subscription.id];
  return { cardPresent: false, forceDecline: marked || options.forceDecline === true };
}

/** An older invoice still open keeps the subscription overdue though the new one is paid. */
function statusOncePaid(desk: Desk, subscription: Stripe.Subscription): Stripe.Subscription.Status {
  return openInvoices(desk, subscription).length === 0 ? 'active' : subscription.status;
}

function statusOnceFailed(subscription: Stripe.Subscription): Stripe.Subscription.Status {
  return subscription.status === 'unpaid' ? 'unpaid' : 'past_due';
}

/** The invoices a subscription still owes, oldest first. */
export function openInvoices(desk: Desk, subscription: Stripe.Subscription): Stripe.Invoice[] {
  return Object.values(desk.book.invoices).filter(
    (invoice) =>
      invoice.status === 'open' && invoice.parent?.subscription_details?.subscription === subscription.id,
  );
}

/** Pays what is owed with the card on file, the card holder being there. Gives whether all is paid. */
export function payOpenInvoices(desk: Desk, subscription: Stripe.Subscription): boolean {
  const open = openInvoices(desk, subscription);
  changeSubscription(desk, subscription, () => {
    const paid = open.map((invoice) => collect(desk, subscription, invoice, { cardPresent: true }));
    if (paid.every((one) => one)) subscription.status = 'active';
  });
  return openInvoices(desk, subscription).length === 0;
}
