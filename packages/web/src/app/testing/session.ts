import type { Membership, Session } from '@bookmatch/common/accounts/accounts-contract';

export function buildMembership(overrides: Partial<Membership> = {}): Membership {
  return {
    shopId: '0190a1b2-0000-7000-8000-000000000800',
    slug: 'northgrain',
    shopName: 'Northgrain Cabinets',
    memberId: '0190a1b2-0000-7000-8000-000000000901',
    role: 'owner',
    unitSystem: 'inch',
    timeZone: 'America/New_York',
    currency: 'USD',
    subscription: { access: 'full', banner: 'none', daysLeft: null },
    ...overrides,
  };
}

export function buildSession(memberships: Membership[] = [buildMembership()]): Session {
  const person = {
    id: '0190a1b2-0000-7000-8000-000000000900',
    name: 'Ada Fenwick',
    email: 'ada@example.test',
    emailConfirmed: true,
  };
  return { person, memberships };
}
