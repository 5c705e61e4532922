import { defineAbility } from '@bookmatch/common/access/ability';
import { ROLES } from '@bookmatch/common/access/roles';
import type { ShopScope } from '../../platform/database/scope.js';
import { sendMail } from '../../platform/mail/mail.js';
import { Person } from '../accounts/accounts-public.js';
import { Customer } from '../customers/customers-public.js';
import { Member, shopOf } from '../shops/shops-public.js';
import type { Estimate } from './estimate.entity.js';
import { letterAboutEstimate, type ShopNews } from './estimate-letters.js';

/** The roles that write estimates, as the abilities say. */
const WRITERS = ROLES.filter((role) => defineAbility({ memberId: '', role }).can('update', 'Estimate'));

/** Tells everybody who writes this shop's estimates what the customer did. */
export async function lettersToShop(
  scope: ShopScope,
  origin: string,
  estimate: Estimate,
  news: ShopNews,
): Promise<void> {
  const shop = await shopOf(scope);
  const customer = await scope.rows(Customer).get(estimate.customerId);
  const url = `${origin}/s/${shop.slug}/estimates/${estimate.id}`;
  for (const to of await writersOf(scope))
    await sendMail(scope, { to, ...letterAboutEstimate(estimate, customer.name, url, news) });
}

async function writersOf(scope: ShopScope): Promise<string[]> {
  const members = await scope.rows(Member).findBy({ role: WRITERS, removedAt: null }, 'createdAt');
  const people = await scope.global(Person).findBy({ id: members.map(({ personId }) => personId) }, 'email');
  return people.map(({ email }) => email);
}
