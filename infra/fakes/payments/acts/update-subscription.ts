import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { invalid } from '../wire/error.js';
import { mergeMetadata } from '../wire/metadata.js';
import { markCancelAtPeriodEnd } from './cancel-at-period-end.js';
import { changeSubscription } from './change-subscription.js';
import { billSubscription, collect } from './invoicing.js';
import { prorate } from './prorate.js';

export interface SubscriptionChange {
  cancelAtPeriodEnd: boolean | undefined;
  items: { id: string; quantity: number }[];
  metadata: Stripe.Metadata | undefined;
  proration: 'always_invoice' | 'create_prorations' | 'none';
}

/** Errors: 400 for an item that is not this subscription's; then nothing is changed. */
export function updateSubscription(
  desk: Desk,
  subscription: Stripe.Subscription,
  change: SubscriptionChange,
): void {
  const wanted = change.items.map((one) => ({ item: itemOf(subscription, one.id), quantity: one.quantity }));
  changeSubscription(desk, subscription, () => {
    for (const { item, quantity } of wanted)
      setQuantity(desk, subscription, item, quantity, change.proration);
    subscription.metadata = mergeMetadata(subscription.metadata, change.metadata);
    if (change.cancelAtPeriodEnd !== undefined) {
      markCancelAtPeriodEnd(desk, subscription, change.cancelAtPeriodEnd);
    }
    if (change.proration === 'always_invoice') invoiceNow(desk, subscription);
  });
}

function itemOf(subscription: Stripe.Subscription, id: string): Stripe.SubscriptionItem {
  const item = subscription.items.data.find((one) => one.id === id);
  if (item === undefined) {
    throw invalid(`No such subscription item: '${id}'`, 'items[0][id]', 'resource_missing');
  }
  return item;
}

/** A trial costs nothing, so a change within it is not prorated. */
function setQuantity(
  desk: Desk,
  subscription: Stripe.Subscription,
  item: Stripe.SubscriptionItem,
  quantity: number,
  proration: SubscriptionChange['proration'],
): void {
  const before = item.quantity ?? 0;
  if (before === quantity) return;
  if (proration !== 'none' && subscription.status !== 'trialing') prorate(desk, item, before, quantity);
  item.quantity = quantity;
}

function invoiceNow(desk: Desk, subscription: Stripe.Subscription): void {
  if ((desk.book.waitingLines[subscription.id] ?? []).length === 0) return;
  const invoice = billSubscription(desk, subscription, 'subscription_update');
  const paid = collect(desk, subscription, invoice, { cardPresent: false });
  if (!paid) subscription.status = 'past_due';
}
