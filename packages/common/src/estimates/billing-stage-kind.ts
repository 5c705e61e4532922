import type { InvoiceKind } from '../invoices/invoice-standings.js';
import type { BillingStage } from './billing-schedule-contract.js';

/** What kind of invoice a stage is billed with: the last stage of the schedule is the final one. */
export function invoiceKindOfStage(schedule: readonly BillingStage[], stageId: string): InvoiceKind {
  const index = schedule.findIndex((stage) => stage.id === stageId);
  if (index < 0) throw new RangeError('the stage is not of this schedule');
  if (schedule[index]!.deposit) return 'deposit';
  return index === schedule.length - 1 ? 'final' : 'progress';
}

/**
 * Whether the job's deposits turn into sales now: every stage that is no deposit has an issued invoice, in whatever
 * order they were billed, or the job is closed.
 */
export function depositsAreEarned(
  schedule: readonly BillingStage[],
  invoicedStageIds: readonly string[],
  jobClosed: boolean,
): boolean {
  if (jobClosed) return true;
  const progress = schedule.filter((stage) => !stage.deposit);
  return progress.length > 0 && progress.every((stage) => invoicedStageIds.includes(stage.id));
}
