import type { SubscriptionStanding } from '@bookmatch/common/subscription/subscription-contract';

export type StoredSubscription = {
  status: string;
  trialEndsAt: Date;
  currentPeriodEnd: Date | null;
  graceEndsAt: Date | null;
};

const DAY_MS = 86_400_000;
const WARN_DAYS = 5;
const READ_ONLY: SubscriptionStanding = { access: 'read-only', banner: 'read-only', daysLeft: null };
const FULL: SubscriptionStanding = { access: 'full', banner: 'none', daysLeft: null };

/** What a shop may do now. */
export function standingOf(subscription: StoredSubscription, now: Date): SubscriptionStanding {
  const { status, trialEndsAt, graceEndsAt } = subscription;
  if (status === 'active') return FULL;
  if (status === 'trialing') return whileIt(trialEndsAt, now, 'trial-ending', WARN_DAYS);
  if (status === 'past_due')
    return whileIt(graceEndsAt ?? now, now, 'past-due-grace', Number.POSITIVE_INFINITY);
  return READ_ONLY;
}

function whileIt(
  ends: Date,
  now: Date,
  banner: 'trial-ending' | 'past-due-grace',
  warnDays: number,
): SubscriptionStanding {
  const daysLeft = Math.ceil((ends.getTime() - now.getTime()) / DAY_MS);
  if (daysLeft <= 0) return READ_ONLY;
  return { access: 'full', banner: daysLeft <= warnDays ? banner : 'none', daysLeft };
}
