import { balanceOf, statusAfter } from '@bookmatch/common/invoices/invoice-standing';
import type { ShopScope } from '../../platform/database/scope.js';
import { JobBillingStage } from '../jobs/jobs-public.js';
import { Invoice } from './invoice.entity.js';

type Moved = { paidCents?: number; creditedCents?: number; overpaidCents?: number };

/**
 * Moves what was paid, credited or overpaid of an issued invoice, and with it the balance and the status. The row must
 * be locked.
 */
export async function moveAmounts(
  scope: ShopScope,
  invoice: Invoice,
  moved: Moved,
  version?: number,
): Promise<Invoice> {
  const amounts = { ...invoice, ...moved };
  const status = statusAfter(amounts);
  const patch = { ...moved, balanceCents: balanceOf(amounts), status };
  const changed = await scope.rows(Invoice).update(invoice, patch, version);
  if (status === 'credited') await freeStage(scope, invoice);
  return changed;
}

/** A billing stage whose invoice is gone, deleted as a draft or credited whole, can be billed again. */
export async function freeStage(scope: ShopScope, invoice: Invoice): Promise<void> {
  if (!invoice.billingStageId) return;
  const stage = await scope.rows(JobBillingStage).getForUpdate(invoice.billingStageId);
  if (stage.invoiceId === invoice.id) await scope.rows(JobBillingStage).update(stage, { invoiceId: null });
}
