import type { InstantText } from '../calendar/shop-dates.js';
import { PLAN } from './plan.js';
import type { SubscriptionStanding, SubscriptionStatus } from './subscription-contract.js';

const DAY_MS = 86_400_000;

export type SubscriptionFacts = {
  status: SubscriptionStatus;
  trialEndsAt: InstantText;
  /** Set when a payment first became past due; null otherwise. */
  graceEndsAt: InstantText | null;
  /** Whether the payment provider has a subscription for the shop. */
  subscribed: boolean;
};

/**
 * What a shop may do now. Lapsed is read-only: everything can be read and exported, nothing written but the
 * subscription. A trial ends by the clock alone, with no word from anybody; one that was subscribed to during the trial
 * goes on until the provider says otherwise, so that a late webhook locks nobody out.
 */
export function subscriptionStanding(facts: SubscriptionFacts, now: InstantText): SubscriptionStanding {
  switch (facts.status) {
    case 'trialing':
      return facts.subscribed ? FULL : trialStanding(facts.trialEndsAt, now);
    case 'active':
      return FULL;
    case 'past_due':
      return graceStanding(facts.graceEndsAt, now);
    case 'trial-ended':
    case 'unpaid':
    case 'paused':
    case 'canceled':
      return READ_ONLY;
  }
}

/** The status to show: a trial nobody subscribed to is over once its time has come. */
export function shownStatus(
  { status, trialEndsAt, subscribed }: SubscriptionFacts,
  now: InstantText,
): SubscriptionStatus {
  const over = status === 'trialing' && !subscribed && daysLeft(trialEndsAt, now) === 0;
  return over ? 'trial-ended' : status;
}

export function trialEnd(signedUpAt: InstantText): InstantText {
  return addDays(signedUpAt, PLAN.trialDays);
}

export function graceEnd(pastDueSince: InstantText): InstantText {
  return addDays(pastDueSince, PLAN.graceDays);
}

const FULL: SubscriptionStanding = { access: 'full', banner: 'none', daysLeft: null };
const READ_ONLY: SubscriptionStanding = { access: 'read-only', banner: 'read-only', daysLeft: null };

function trialStanding(trialEndsAt: InstantText, now: InstantText): SubscriptionStanding {
  const left = daysLeft(trialEndsAt, now);
  if (left === 0) return READ_ONLY;
  return { access: 'full', banner: left <= PLAN.trialEndingDays ? 'trial-ending' : 'none', daysLeft: left };
}

function graceStanding(graceEndsAt: InstantText | null, now: InstantText): SubscriptionStanding {
  const left = graceEndsAt === null ? 0 : daysLeft(graceEndsAt, now);
  return left === 0 ? READ_ONLY : { access: 'full', banner: 'past-due-grace', daysLeft: left };
}

/** Days of 24 hours until an instant, a day begun counted whole; 0 from that instant on. */
function daysLeft(until: InstantText, now: InstantText): number {
  return Math.max(0, Math.ceil((Date.parse(until) - Date.parse(now)) / DAY_MS));
}

function addDays(instant: InstantText, days: number): InstantText {
  return new Date(Date.parse(instant) + days * DAY_MS).toISOString();
}
