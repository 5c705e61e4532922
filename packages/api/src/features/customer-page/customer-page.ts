import type { CustomerPage, ShopIdentity } from '@bookmatch/common/customer-page/customer-page-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ResolvedLink } from '../../platform/http/route.js';
import { shopOf } from '../shops/shops-public.js';

type PartOf<Subject> = Omit<Extract<CustomerPage, { subject: Subject }>, 'subject' | 'shop'>;
/** What stands behind a link, by what it is about; each slice reads its own. */
export type PageReaders = {
  estimate(scope: ShopScope, id: string): Promise<PartOf<'estimate'>['estimate']>;
  invoice(scope: ShopScope, id: string): Promise<PartOf<'invoice'>['invoice']>;
};

/** The page of a link. */
export async function readCustomerPage(
  scope: ShopScope,
  { subject, subjectId }: ResolvedLink,
  readers: PageReaders,
): Promise<CustomerPage> {
  const shop = await identityOf(scope);
  if (subject === 'estimate') return { subject, shop, estimate: await readers.estimate(scope, subjectId) };
  return { subject, shop, invoice: await readers.invoice(scope, subjectId) };
}

async function identityOf(scope: ShopScope): Promise<ShopIdentity> {
  const { name, phone, email, address, timeZone } = await shopOf(scope);
  return { name, phone, email, address, timeZone };
}
