import type { Address } from '@bookmatch/common/customers/customers-contract';
import type { GlobalScope } from '../../platform/database/scope.js';
import { Member } from './member.entity.js';
import { createDefaultOperations } from './operations-service.js';
import { createCounters } from './shop-counters.js';
import { Shop } from './shop.entity.js';

type NewShop = { shopName: string; timeZone: string; unitSystem: 'inch' | 'metric' };
const NO_ADDRESS: Address = { street: '', street2: '', city: '', region: '', postalCode: '' };
/** What a shop starts with until it sets its own: half down, the rest when installed. */
const FIRST_SCHEDULE = [
  { name: 'Deposit', share: { percent: '50' }, deposit: true, due: 'on-acceptance' },
  { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' },
];

/** Makes a shop with its owner and its counters, and answers the shop's id. */
export async function createShop(scope: GlobalScope, personId: string, input: NewShop): Promise<string> {
  const shop = await scope.global(Shop).insert({
    id: scope.newId(),
    version: 1,
    updatedAt: scope.now,
    slug: await freeSlug(scope, input.shopName),
    name: input.shopName,
    phone: '',
    email: '',
    address: NO_ADDRESS,
    timeZone: input.timeZone,
    unitSystem: input.unitSystem,
    currency: 'USD',
    taxRule: 'on-price',
    defaultTaxRate: '0',
    estimateTerms: '',
    estimateValidDays: 30,
    invoiceDueDays: 14,
    defaultBillingSchedule: FIRST_SCHEDULE,
    paymentAccountId: null,
    cardPayments: 'not-set-up',
  });
  const inShop = scope.forShop(shop.id);
  await inShop
    .rows(Member)
    .insert({ id: scope.newId(), personId, role: 'owner', laborCostCentsPerHour: null, removedAt: null });
  await createCounters(inShop);
  await createDefaultOperations(inShop);
  return shop.id;
}

/** `Alder & Sons` → `alder-sons`, or `alder-sons-2` when that is taken. */
async function freeSlug(scope: GlobalScope, name: string): Promise<string> {
  const base = slugOf(name);
  for (let attempt = 1; ; attempt += 1) {
    const slug = attempt === 1 ? base : `${base}-${attempt}`;
    if (!(await scope.global(Shop).findOneBy({ slug }))) return slug;
  }
}

export function slugOf(name: string): string {
  const plain = name.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
  return (
    plain
      .replace(/[^a-z0-9]+/g, '-')
      .replace(/^-+|-+$/g, '')
      .slice(0, 50)
      .replace(/-+$/, '') || 'shop'
  );
}
