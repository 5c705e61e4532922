import type { Address } from '@bookmatch/common/customers/customers-contract';
import { DEFAULT_BILLING_SCHEDULE, NEW_SHOP } from '@bookmatch/common/shops/new-shop';
import type { CreateShop } from '@bookmatch/common/shops/shops-contract';
import type { GlobalScope } from '../../platform/database/scope.js';
import { Member } from './member.entity.js';
import { createDefaultOperations } from './operations-service.js';
import { createCounters } from './shop-counters.js';
import { Shop } from './shop.entity.js';

const NO_ADDRESS: Address = { street: '', street2: '', city: '', region: '', postalCode: '' };

/** Makes a shop with its owner and its counters, and answers the shop's id. */
export async function createShop(scope: GlobalScope, personId: string, input: CreateShop): Promise<string> {
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
    ...NEW_SHOP,
    defaultBillingSchedule: [...DEFAULT_BILLING_SCHEDULE],
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
