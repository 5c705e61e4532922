import { depositsAreEarned } from '@bookmatch/common/estimates/billing-stage-kind';
import { postDepositEarned } from '@bookmatch/common/ledger/postings';
import type { ShopScope } from '../../platform/database/scope.js';
import { Job, JobBillingStage } from '../jobs/jobs-public.js';
import { postEntry } from '../ledger/ledger-public.js';
import { CreditNote } from './credit-note.entity.js';
import { Invoice } from './invoice.entity.js';

/**
 * Turns a job's deposits into sales once they are earned: its last stage is invoiced, or the job is closed. Called after
 * each invoice of the job is issued and when the job closes; does nothing when it is too early or all is done.
 *
 * @param today in the shop's zone
 */
export async function earnDeposits(scope: ShopScope, jobId: string, today: string): Promise<void> {
  // Locked, so that two last stages issued at once do not each take the other for missing.
  const job = await scope.rows(Job).getForUpdate(jobId);
  const invoices = await scope.rows(Invoice).findBy({ jobId }, 'numberOrder', true);
  const schedule = await scope.rows(JobBillingStage).findBy({ jobId }, 'position');
  const invoiced = invoices.filter(({ status }) => status === 'issued' || status === 'paid');
  const stageIds = invoiced.flatMap(({ billingStageId }) => billingStageId ?? []);
  if (!depositsAreEarned(schedule, stageIds, job.closedAt !== null)) return;
  for (const invoice of invoices)
    if (invoice.kind === 'deposit' && invoice.status !== 'draft' && invoice.depositEarnedOn === null)
      await earn(scope, invoice, today);
}

/** What credit notes took back of a deposit was never earned. */
async function earn(scope: ShopScope, invoice: Invoice, today: string): Promise<void> {
  const notes = await scope.rows(CreditNote).findBy({ invoiceId: invoice.id });
  const left = notes.reduce(
    (rest, note) => ({
      netCents: rest.netCents - note.netCents,
      taxCents: rest.taxCents - note.taxCents,
    }),
    { netCents: invoice.netCents, taxCents: invoice.taxCents },
  );
  await scope.rows(Invoice).update(invoice, { depositEarnedOn: today });
  if (left.netCents + left.taxCents === 0) return;
  await postEntry(scope, {
    kind: 'deposit-earned',
    on: today,
    memo: `Deposit of invoice ${invoice.number} earned`,
    source: { kind: 'invoice', id: invoice.id },
    invoiceId: invoice.id,
    lines: postDepositEarned(left, invoice),
  });
}
