import type { ShopScope } from '../../platform/database/scope.js';
import type { JobInvoice } from './job-billing.js';
import { JobBillingStage } from './job-billing-stage.entity.js';

/** Whether an invoice bills its stage: it was issued, and not credited whole. */
export function bills(invoice: JobInvoice): boolean {
  return invoice.standing !== 'draft' && invoice.standing !== 'credited';
}

/** The names of the stages that no invoice bills yet, in order. */
export async function unbilledStages(
  scope: ShopScope,
  jobId: string,
  invoices: readonly JobInvoice[],
): Promise<string[]> {
  const billed = new Set(invoices.filter(bills).map((invoice) => invoice.billingStageId));
  const stages = await scope.rows(JobBillingStage).findBy({ jobId }, 'position');
  return stages.filter((stage) => !billed.has(stage.id)).map((stage) => stage.name);
}
