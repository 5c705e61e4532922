import { graceEnd, shownStatus, subscriptionStanding, trialEnd, type SubscriptionFacts } from './standing.js';
import { SUBSCRIPTION_STATUSES } from './subscription-contract.js';
import {
  PROVIDER_STATUSES,
  subscriptionAfter,
  type ProviderSubscription,
  type SubscriptionState,
} from './transitions.js';

const now = '2027-03-15T12:00:00.000Z';
const inDays = (days: number) => new Date(Date.parse(now) + days * 86_400_000).toISOString();
const facts = (overrides: Partial<SubscriptionFacts>): SubscriptionFacts => ({
  status: 'trialing',
  trialEndsAt: inDays(10),
  graceEndsAt: null,
  subscribed: false,
  ...overrides,
});

describe('a trial', () => {
  it('lasts 14 days from sign-up', () => {
    expect(trialEnd('2027-03-01T12:00:00.000Z')).toBe('2027-03-15T12:00:00.000Z');
  });

  it.each([
    [10, { access: 'full', banner: 'none', daysLeft: 10 }],
    [4, { access: 'full', banner: 'trial-ending', daysLeft: 4 }],
    [0.01, { access: 'full', banner: 'trial-ending', daysLeft: 1 }],
    [0, { access: 'read-only', banner: 'read-only', daysLeft: null }],
    [-3, { access: 'read-only', banner: 'read-only', daysLeft: null }],
  ])('with %d days to go is %j', (days, standing) => {
    expect(subscriptionStanding(facts({ trialEndsAt: inDays(days) }), now)).toEqual(standing);
  });

  it('ends by the clock alone', () => {
    expect(shownStatus(facts({ trialEndsAt: now }), now)).toBe('trial-ended');
    expect(shownStatus(facts({ trialEndsAt: inDays(0.5) }), now)).toBe('trialing');
  });

  it('that was subscribed to is not locked by a late webhook', () => {
    const late = facts({ trialEndsAt: inDays(-1), subscribed: true });
    expect(subscriptionStanding(late, now).access).toBe('full');
    expect(shownStatus(late, now)).toBe('trialing');
  });
});

describe('a past due payment', () => {
  it('leaves full access for seven days, with a banner', () => {
    const due = facts({ status: 'past_due', graceEndsAt: graceEnd(now) });
    expect(subscriptionStanding(due, now)).toEqual({ access: 'full', banner: 'past-due-grace', daysLeft: 7 });
    expect(subscriptionStanding(due, inDays(6.99)).access).toBe('full');
    expect(subscriptionStanding(due, inDays(7))).toMatchObject({ access: 'read-only', banner: 'read-only' });
  });
});

it('every status has a standing, and only a running one writes', () => {
  const writing = SUBSCRIPTION_STATUSES.filter(
    (status) => subscriptionStanding(facts({ status, graceEndsAt: inDays(1) }), now).access === 'full',
  );
  expect(writing).toEqual(['trialing', 'active', 'past_due']);
});

describe('what the payment provider says', () => {
  const state: SubscriptionState = {
    status: 'trialing',
    currentPeriodEnd: null,
    graceEndsAt: null,
    cancelAtPeriodEnd: false,
    paidMembers: 0,
  };
  const said = (status: ProviderSubscription['status']): ProviderSubscription => ({
    status,
    currentPeriodEnd: inDays(30),
    cancelAtPeriodEnd: false,
    quantity: 5,
  });

  it('is taken over, but for a first payment that is not through', () => {
    const after = PROVIDER_STATUSES.map((status) => subscriptionAfter(state, said(status), now).status);
    expect(after).toEqual([
      'trialing',
      'trialing',
      'trialing',
      'active',
      'past_due',
      'canceled',
      'unpaid',
      'paused',
    ]);
  });

  it('changes nothing the second time, so that grace is not renewed', () => {
    const once = subscriptionAfter(state, said('past_due'), now);
    expect(once.graceEndsAt).toBe(inDays(7));
    expect(subscriptionAfter(once, said('past_due'), inDays(3))).toEqual(once);
  });

  it('ends the grace when the payment came', () => {
    const due = subscriptionAfter(state, said('past_due'), now);
    expect(subscriptionAfter(due, said('active'), inDays(2))).toMatchObject({
      status: 'active',
      graceEndsAt: null,
    });
  });

  it('keeps the period already paid when an object names none', () => {
    const active = subscriptionAfter(state, said('active'), now);
    expect(
      subscriptionAfter(active, { ...said('canceled'), currentPeriodEnd: null }, now).currentPeriodEnd,
    ).toBe(inDays(30));
  });
});
