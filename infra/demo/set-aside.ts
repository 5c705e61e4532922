import { Person as PersonRow } from '@bookmatch/api/features/accounts/accounts-public';
import { Member, Shop } from '@bookmatch/api/features/shops/shops-public';
import type { GlobalScope } from '@bookmatch/api/platform/database/scope';
import type { Platform } from '@bookmatch/api/platform/platform';
import type { Person } from './cast/people.js';
import { systemAt } from './making/desk.js';
import { Letters } from './making/letters.js';

/**
 * Sets aside what a run left that was killed half way. Books cannot be deleted, so its shops stay, under another name
 * and address, and its people lose the addresses that the next run needs. Answers whether there was anything.
 */
export async function setAside(platform: Platform, people: readonly Person[], now: Date): Promise<boolean> {
  const emails = people.map(({ email }) => email);
  const shopIds = await platform.work.transaction(systemAt(now), async (scope) => {
    const left = await scope.global(PersonRow).findBy({ email: emails }, 'email', true);
    const shops = new Map<string, Shop>();
    for (const person of left) for (const shop of await shopsOf(scope, person)) shops.set(shop.id, shop);
    for (const person of left) await freeAddress(scope, person, now);
    for (const shop of shops.values()) await freeName(scope, shop, now);
    return [...shops.keys()];
  });
  if (shopIds.length === 0) return false;
  await new Letters(platform).keepFromSending(shopIds, emails, now);
  return true;
}

async function shopsOf(scope: GlobalScope, { id: personId }: PersonRow): Promise<Shop[]> {
  const members = await scope.acrossShops(Member, { personId });
  return scope.global(Shop).findBy({ id: members.map(({ shopId }) => shopId) });
}

async function freeAddress(scope: GlobalScope, person: PersonRow, now: Date): Promise<void> {
  await scope.global(PersonRow).update(person, { email: `unfinished-${now.getTime()}-${person.email}` });
}

async function freeName(scope: GlobalScope, shop: Shop, now: Date): Promise<void> {
  const slug = `unfinished-${now.getTime()}-${shop.slug}`.slice(0, 60);
  await scope
    .forShop(shop.id)
    .global(Shop)
    .update(shop, { slug, name: `Unfinished: ${shop.name}`.slice(0, 120) });
}
