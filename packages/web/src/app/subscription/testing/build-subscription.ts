import type { Subscription } from '@bookmatch/common/subscription/subscription-contract';

export function buildSubscription(overrides: Partial<Subscription> = {}): Subscription {
  return {
    status: 'trialing',
    standing: { access: 'full', banner: 'none', daysLeft: 12 },
    trialEndsAt: '2026-06-15T12:00:00Z',
    currentPeriodEnd: null,
    graceEndsAt: null,
    cancelAtPeriodEnd: false,
    members: 4,
    pricePerMemberCents: 2_900,
    monthlyTotalCents: 11_600,
    ...overrides,
  };
}
