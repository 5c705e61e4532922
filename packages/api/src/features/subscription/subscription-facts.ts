import { subscriptionStanding, type SubscriptionFacts } from '@bookmatch/common/subscription/standing';
import type { SubscriptionStanding } from '@bookmatch/common/subscription/subscription-contract';
import type { SubscriptionState } from '@bookmatch/common/subscription/transitions';
import type { ShopScope } from '../../platform/database/scope.js';
import { Subscription } from './subscription.entity.js';

/** The columns that the rule of standing needs. */
export type StoredStanding = Pick<
  Subscription,
  'status' | 'trialEndsAt' | 'graceEndsAt' | 'providerSubscriptionId'
>;

export function factsOf(stored: StoredStanding): SubscriptionFacts {
  return {
    status: stored.status,
    trialEndsAt: stored.trialEndsAt.toISOString(),
    graceEndsAt: stored.graceEndsAt?.toISOString() ?? null,
    subscribed: stored.providerSubscriptionId !== null,
  };
}

/** What a shop may do now. */
export function standingOf(stored: StoredStanding, now: Date): SubscriptionStanding {
  return subscriptionStanding(factsOf(stored), now.toISOString());
}

export function stateOf(row: Subscription): SubscriptionState {
  return {
    status: row.status,
    currentPeriodEnd: row.currentPeriodEnd?.toISOString() ?? null,
    graceEndsAt: row.graceEndsAt?.toISOString() ?? null,
    cancelAtPeriodEnd: row.cancelAtPeriodEnd,
    paidMembers: row.paidMembers,
  };
}

export function columnsOf({ currentPeriodEnd, graceEndsAt, ...rest }: SubscriptionState) {
  const date = (instant: string | null) => (instant === null ? null : new Date(instant));
  return { ...rest, currentPeriodEnd: date(currentPeriodEnd), graceEndsAt: date(graceEndsAt) };
}

/** The shop's one row. */
export async function subscriptionOf(scope: ShopScope, lock = false): Promise<Subscription> {
  const row = await scope.rows(Subscription).findOneBy({}, lock);
  if (!row) throw new TypeError('The shop has no subscription row.');
  return row;
}
