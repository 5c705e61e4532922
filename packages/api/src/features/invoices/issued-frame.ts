import type { Address } from '@bookmatch/common/customers/customers-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer } from '../customers/customers-public.js';
import { Job, JobBillingStage } from '../jobs/jobs-public.js';
import { shopOf } from '../shops/shops-public.js';

/** What an invoice says besides its lines and amounts, kept with it so that its PDF stays what the customer got. */
export type IssuedFrame = {
  currency: string;
  shop: { name: string; address: Address; phone: string; email: string };
  customer: { name: string; company: string; address: Address };
  job: { number: number; title: string } | null;
  stageName: string | null;
};

type Framed = { customerId: string; jobId: string | null; billingStageId: string | null };

/** The frame as it would be if the invoice were issued now. */
export async function currentFrame(scope: ShopScope, invoice: Framed): Promise<IssuedFrame> {
  const { customerId, jobId, billingStageId } = invoice;
  const shop = await shopOf(scope);
  const customer = await scope.rows(Customer).get(customerId);
  const job = jobId ? await scope.rows(Job).get(jobId) : null;
  const stage = billingStageId ? await scope.rows(JobBillingStage).get(billingStageId) : null;
  return {
    currency: shop.currency,
    shop: { name: shop.name, address: shop.address, phone: shop.phone, email: shop.email },
    customer: { name: customer.name, company: customer.company, address: customer.billingAddress },
    job: job && { number: job.number, title: job.title },
    stageName: stage?.name ?? null,
  };
}
