import {
  PROVIDER_STATUSES,
  type ProviderStatus,
  type ProviderSubscription,
} from '@bookmatch/common/subscription/transitions';
import type Stripe from 'stripe';

/** What matters of the provider's object, as plain data that can be compared. */
export type ProviderFacts = ProviderSubscription & {
  id: string;
  customerId: string;
  shopId: string | null;
  itemId: string;
};

/** Unix seconds, as the provider counts, to an instant. */
const instant = (seconds: number | undefined) =>
  seconds === undefined ? null : new Date(seconds * 1000).toISOString();

/** @throws TypeError on a subscription without its one item, or with a status that is not in our list */
export function readSubscription(subscription: Stripe.Subscription): ProviderFacts {
  const [item] = subscription.items.data;
  if (!item) throw new TypeError(`Subscription ${subscription.id} has no item.`);
  return {
    id: subscription.id,
    customerId: idOf(subscription.customer),
    shopId: subscription.metadata['shopId'] ?? null,
    itemId: item.id,
    status: statusOf(subscription),
    currentPeriodEnd: instant(item.current_period_end),
    cancelAtPeriodEnd: subscription.cancel_at_period_end || subscription.cancel_at !== null,
    quantity: item.quantity ?? 0,
  };
}

function statusOf({ id, status }: Stripe.Subscription): ProviderStatus {
  const known = PROVIDER_STATUSES.find((one) => one === status);
  if (!known) throw new TypeError(`Subscription ${id} has the status ${status}, which means nothing here.`);
  return known;
}

/** The provider gives an id, or the whole object where it was asked for. */
export function idOf(reference: string | { id: string }): string {
  return typeof reference === 'string' ? reference : reference.id;
}

/** Over for good, or never begun: it neither pays nor can be paid. */
export function isOver({ status }: ProviderSubscription): boolean {
  return status === 'canceled' || status === 'incomplete_expired' || status === 'incomplete';
}
