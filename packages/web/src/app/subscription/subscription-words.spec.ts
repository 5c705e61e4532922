import {
  SUBSCRIPTION_STATUSES,
  type Subscription,
} from '@bookmatch/common/subscription/subscription-contract';
import { buildSubscription } from './testing/build-subscription';
import { isSubscribed, wordsOf } from './subscription-words';

const date = (instant: string | null) => instant?.slice(0, 10) ?? '';
const say = (fields: Partial<Subscription>) => wordsOf(buildSubscription(fields), date);

describe('the words of a subscription', () => {
  it('has a sentence for every status', () => {
    const texts = SUBSCRIPTION_STATUSES.map((status) => say({ status }).text);
    expect(new Set(texts).size).toBe(SUBSCRIPTION_STATUSES.length);
  });

  it('names the day that something ends', () => {
    expect(say({ status: 'trialing' }).text).toContain('2026-06-15');
    const paid = { currentPeriodEnd: '2026-07-15T12:00:00Z' };
    expect(say({ status: 'trialing', ...paid }).text).toContain('first payment is due then');
    expect(say({ status: 'active', ...paid }).text).toContain('2026-07-15');
    expect(say({ status: 'active', cancelAtPeriodEnd: true, ...paid })).toMatchObject({ chip: 'Ends soon' });
    const grace = { graceEndsAt: '2026-06-08T12:00:00Z' };
    expect(say({ status: 'past_due', ...grace }).text).toContain('2026-06-08');
  });

  it('is managed at the provider once there is a subscription, and started while there is none', () => {
    const subscribed = (fields: Partial<Subscription>) => isSubscribed(buildSubscription(fields));
    expect(subscribed({ status: 'trialing' })).toBe(false);
    expect(subscribed({ status: 'trialing', currentPeriodEnd: '2026-06-15T12:00:00Z' })).toBe(true);
    expect(subscribed({ status: 'unpaid' })).toBe(true);
    expect(subscribed({ status: 'canceled' })).toBe(false);
  });
});
