import type { ShopScope } from '../../platform/database/scope.js';
import { Customer } from '../customers/customers-public.js';
import { EstimateSend } from './estimate-send.entity.js';
import type { Estimate } from './estimate.entity.js';

/** Where letters about an estimate go: where it was last sent, or else the customer's own address; null without one. */
export async function customerAddress(scope: ShopScope, estimate: Estimate): Promise<string | null> {
  const sends = await scope.rows(EstimateSend).findBy({ estimateId: estimate.id }, 'createdAt');
  const customer = await scope.rows(Customer).get(estimate.customerId);
  return sends.at(-1)?.to ?? (customer.email || null);
}
