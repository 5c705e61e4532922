import { invoiceStanding } from '@bookmatch/common/invoices/invoice-standing';
import type { ShopScope } from '../../platform/database/scope.js';
import type { JobBilling, JobInvoice } from '../jobs/jobs-public.js';
import { todayOf } from '../shops/shops-public.js';
import { CreditNote } from './credit-note.entity.js';
import { Invoice } from './invoice.entity.js';

/** What a job's page says of its invoices. */
export const jobInvoices: JobBilling = {
  async invoicesOf(scope, jobId) {
    const invoices = await scope.rows(Invoice).findBy({ jobId }, 'id');
    if (invoices.length === 0) return [];
    const creditedNet = await creditedNetOf(
      scope,
      invoices.map(({ id }) => id),
    );
    const today = await todayOf(scope);
    return invoices.map((invoice) => viewInvoice(invoice, creditedNet.get(invoice.id) ?? 0, today));
  },
};

function viewInvoice(invoice: Invoice, creditedNetCents: number, today: string): JobInvoice {
  const { id, number, billingStageId, status, paidCents, dueOn } = invoice;
  const issued = status !== 'draft';
  return {
    id,
    number,
    billingStageId,
    ...invoiceStanding(status, paidCents, dueOn, today),
    billedCents: issued ? invoice.totalCents - invoice.creditedCents : 0,
    billedNetCents: issued ? invoice.netCents - creditedNetCents : 0,
    paidCents,
  };
}

async function creditedNetOf(scope: ShopScope, invoiceIds: readonly string[]): Promise<Map<string, number>> {
  const notes = await scope.rows(CreditNote).findBy({ invoiceId: invoiceIds });
  const sums = new Map<string, number>();
  for (const { invoiceId, netCents } of notes) sums.set(invoiceId, (sums.get(invoiceId) ?? 0) + netCents);
  return sums;
}
