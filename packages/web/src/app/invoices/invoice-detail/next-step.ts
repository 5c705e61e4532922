import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';

/** What the thread asks for next: the one primary action of the screen. */
export type InvoiceStep = 'finish' | 'issue' | 'send' | 'pay' | 'refund' | 'none';

export function nextStep(invoice: Invoice): InvoiceStep {
  if (invoice.overpaidCents > 0) return 'refund';
  if (invoice.status === 'draft') return invoice.issueRefusals.length > 0 ? 'finish' : 'issue';
  if (invoice.status !== 'issued') return 'none';
  return invoice.sends.some(({ document }) => document === 'invoice') ? 'pay' : 'send';
}
