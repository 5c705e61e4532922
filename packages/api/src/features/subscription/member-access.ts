import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import type { Role } from '@bookmatch/common/access/roles';
import type { GlobalScope, ShopScope } from '../../platform/database/scope.js';
import { ProblemError } from '../../platform/http/problem-error.js';
import { Member, Shop } from '../shops/shops-public.js';
import { standingOf, subscriptionOf, type StoredStanding } from './subscription-facts.js';
import { Subscription } from './subscription.entity.js';

const STANDING_COLUMNS: Record<keyof StoredStanding, string> = {
  status: 'subscription.status',
  trialEndsAt: 'subscription.trialEndsAt',
  graceEndsAt: 'subscription.graceEndsAt',
  providerSubscriptionId: 'subscription.providerSubscriptionId',
};

/** The member a person is in the shop, and whether the shop may write: one look-up at every request. */
export async function memberAccess(scope: ShopScope, personId: string) {
  const row = await scope
    .query(Member, 'member')
    .join(Subscription, 'subscription', '1 = 1')
    .joinShop(Shop, 'shop')
    .pick({ memberId: 'member.id', role: 'member.role', timeZone: 'shop.time_zone', ...STANDING_COLUMNS })
    .where('member.personId = :personId and member.removedAt is null', { personId })
    .first<{ memberId: string; role: Role; timeZone: string } & StoredStanding>();
  if (!row) return null;
  return {
    memberId: row.memberId,
    role: row.role,
    timeZone: row.timeZone,
    readOnly: standingOf(row, scope.now).access === 'read-only',
  };
}

/** For work in a shop that no member of it asks for. @throws subscription-lapsed */
export async function refuseLapsed(scope: ShopScope): Promise<void> {
  if (standingOf(await subscriptionOf(scope), scope.now).access === 'read-only')
    throw new ProblemError('subscription-lapsed', "The shop's subscription has lapsed. Ask its owner.");
}

/** All shops a person belongs to, by name. */
export async function membershipsOf(scope: GlobalScope, personId: string): Promise<Membership[]> {
  const members = await scope.acrossShops(Member, { personId });
  const current = members.filter((member) => member.removedAt === null);
  const memberships = await Promise.all(current.map((member) => viewMembership(scope, member)));
  return memberships.sort((a, b) => a.shopName.localeCompare(b.shopName));
}

async function viewMembership(scope: GlobalScope, member: Member): Promise<Membership> {
  const shop = await scope.global(Shop).get(member.shopId);
  return {
    shopId: shop.id,
    slug: shop.slug,
    shopName: shop.name,
    memberId: member.id,
    role: member.role,
    unitSystem: shop.unitSystem,
    timeZone: shop.timeZone,
    currency: shop.currency,
    subscription: standingOf(await subscriptionOf(scope.forShop(shop.id)), scope.now),
  };
}
