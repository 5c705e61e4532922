import type { ShopScope } from '../../platform/database/scope.js';
import { Person } from '../accounts/accounts-public.js';
import { Member } from '../shops/shops-public.js';

/** Those who can do something about the subscription. */
export async function ownersOf(scope: ShopScope): Promise<Person[]> {
  const members = await scope.rows(Member).findBy({ role: 'owner', removedAt: null });
  return scope.global(Person).findBy({ id: members.map(({ personId }) => personId) });
}

/** What the plan is priced by, counted here and never taken from a request. */
export async function countMembers(scope: ShopScope): Promise<number> {
  return scope.query(Member, 'member').where('member.removedAt is null').count();
}
