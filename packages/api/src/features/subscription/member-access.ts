import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import type { Role } from '@bookmatch/common/access/roles';
import type { GlobalScope, ShopScope } from '../../platform/database/scope.js';
import { Member, Shop } from '../shops/shops-public.js';
import { standingOf, type StoredSubscription } from './standing.js';
import { Subscription } from './subscription.entity.js';

const STANDING_COLUMNS = {
  status: 'subscription.status',
  trialEndsAt: 'subscription.trialEndsAt',
  currentPeriodEnd: 'subscription.currentPeriodEnd',
  graceEndsAt: 'subscription.graceEndsAt',
};

/** The member a person is in the shop, and whether the shop may write: one look-up at every request. */
export async function memberAccess(scope: ShopScope, personId: string) {
  const row = await scope
    .query(Member, 'member')
    .join(Subscription, 'subscription', '1 = 1')
    .pick({ memberId: 'member.id', role: 'member.role', ...STANDING_COLUMNS })
    .where('member.personId = :personId and member.removedAt is null', { personId })
    .first<{ memberId: string; role: Role } & StoredSubscription>();
  if (!row) return null;
  return {
    memberId: row.memberId,
    role: row.role,
    readOnly: standingOf(row, scope.now).access === 'read-only',
  };
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
  const [subscription] = await scope.forShop(member.shopId).rows(Subscription).findBy({});
  if (!subscription) throw new TypeError('The shop has no subscription row.');
  return {
    shopId: shop.id,
    slug: shop.slug,
    shopName: shop.name,
    memberId: member.id,
    role: member.role,
    unitSystem: shop.unitSystem,
    timeZone: shop.timeZone,
    currency: shop.currency as Membership['currency'],
    subscription: standingOf(subscription, scope.now),
  };
}
