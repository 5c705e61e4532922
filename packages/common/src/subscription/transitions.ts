import type { InstantText } from '../calendar/shop-dates.js';
import { graceEnd } from './standing.js';
import type { SubscriptionStatus } from './subscription-contract.js';

/** The payment provider's own words for a subscription's status. */
export const PROVIDER_STATUSES = [
  'incomplete',
  'incomplete_expired',
  'trialing',
  'active',
  'past_due',
  'canceled',
  'unpaid',
  'paused',
] as const;
export type ProviderStatus = (typeof PROVIDER_STATUSES)[number];

/** What of the provider's subscription object matters here, read fresh when the order of events is in doubt. */
export type ProviderSubscription = {
  status: ProviderStatus;
  currentPeriodEnd: InstantText | null;
  cancelAtPeriodEnd: boolean;
  /** Members paid for. */
  quantity: number;
};

/** What is stored of a shop's subscription and changes by the provider's word. */
export type SubscriptionState = {
  status: SubscriptionStatus;
  currentPeriodEnd: InstantText | null;
  graceEndsAt: InstantText | null;
  cancelAtPeriodEnd: boolean;
  paidMembers: number;
};

/**
 * The state after the provider's object was seen. The object is the whole truth, so seeing it twice changes nothing
 * more: the grace period starts when a payment first is past due and is not renewed by hearing of it again.
 *
 * @param at when the event happened
 */
export function subscriptionAfter(
  state: SubscriptionState,
  provider: ProviderSubscription,
  at: InstantText,
): SubscriptionState {
  const status = statusAfter(state.status, provider.status);
  return {
    status,
    currentPeriodEnd: provider.currentPeriodEnd ?? state.currentPeriodEnd,
    graceEndsAt: status === 'past_due' ? (state.graceEndsAt ?? graceEnd(at)) : null,
    cancelAtPeriodEnd: provider.cancelAtPeriodEnd,
    paidMembers: provider.quantity,
  };
}

/** A first payment that is not through, or never came, leaves the shop where it was: its trial goes on or has ended. */
function statusAfter(current: SubscriptionStatus, provider: ProviderStatus): SubscriptionStatus {
  return provider === 'incomplete' || provider === 'incomplete_expired' ? current : provider;
}
