import type { Invitation, Member } from '@bookmatch/common/shops/members-contract';
import { DEFAULT_BILLING_SCHEDULE } from '@bookmatch/common/shops/new-shop';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import type { Shop } from '@bookmatch/common/shops/shops-contract';

const id = (last: string) => `0190a1b2-0000-7000-8000-000000000${last}`;

export function buildShop(overrides: Partial<Shop> = {}): Shop {
  return {
    id: id('800'),
    version: 3,
    slug: 'northgrain',
    name: 'Northgrain Cabinets',
    phone: '555 0100',
    email: 'office@northgrain.test',
    address: { street: '4 Quarry Road', street2: '', city: 'Stowe', region: 'VT', postalCode: '05672' },
    timeZone: 'America/New_York',
    unitSystem: 'inch',
    currency: 'USD',
    defaultTaxRate: '0.07',
    taxRule: 'on-price',
    estimateTerms: '',
    estimateValidDays: 30,
    invoiceDueDays: 14,
    defaultBillingSchedule: [...DEFAULT_BILLING_SCHEDULE],
    cardPayments: 'not-set-up',
    ...overrides,
  };
}

export function buildMember(overrides: Partial<Member> = {}): Member {
  return {
    id: id('901'),
    version: 1,
    personId: id('900'),
    name: 'Ada Fenwick',
    email: 'ada@example.test',
    role: 'owner',
    joinedAt: '2026-01-05T15:00:00.000Z',
    laborCostCentsPerHour: null,
    ...overrides,
  };
}

export function buildInvitation(overrides: Partial<Invitation> = {}): Invitation {
  return {
    id: id('701'),
    email: 'newhand@example.test',
    role: 'crew',
    invitedBy: 'Ada Fenwick',
    sentAt: '2026-06-01T12:00:00.000Z',
    expiresAt: '2126-06-08T12:00:00.000Z',
    ...overrides,
  };
}

export function buildOperation(overrides: Partial<Operation> = {}): Operation {
  return {
    id: id('601'),
    version: 1,
    name: 'Cut sheet goods',
    position: 1,
    costCategory: 'labor',
    onJob: true,
    archived: false,
    defaultRateCentsPerHour: 6_500,
    ...overrides,
  };
}
