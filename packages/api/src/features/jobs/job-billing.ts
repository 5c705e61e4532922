import type { InvoiceStanding } from '@bookmatch/common/invoices/invoice-standings';
import type { ShopScope } from '../../platform/database/scope.js';

/** An invoice of a job, draft or issued. Amounts are zero while it is a draft. */
export type JobInvoice = {
  id: string;
  /** Null until it is issued. */
  number: number | null;
  /** Null for an invoice with lines of its own. */
  billingStageId: string | null;
  standing: InvoiceStanding;
  daysOverdue: number;
  /** With tax, less credit notes. */
  billedCents: number;
  /** Without tax, less credit notes. */
  billedNetCents: number;
  paidCents: number;
};

/** What jobs need to know of invoices, which stand above them; see `ClockedTime`. */
export interface JobBilling {
  /** All invoices of the job, oldest first: those that bill a stage and the others. */
  invoicesOf(scope: ShopScope, jobId: string): Promise<JobInvoice[]>;
}
