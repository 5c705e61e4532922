import type { InvoiceKind, InvoiceStanding, PaymentKind, PaymentMethod } from './invoice-standings.js';
import type { InvoiceDocumentKind } from './invoices-contract.js';

/** The same words on the screen, in letters and in documents. */
export const PAYMENT_METHOD_NAMES: Record<PaymentMethod, string> = {
  card: 'Card',
  check: 'Check',
  cash: 'Cash',
  transfer: 'Transfer',
};

export const PAYMENT_KIND_NAMES: Record<PaymentKind, string> = {
  payment: 'Payment',
  reversal: 'Taken back',
  refund: 'Given back',
};

export const INVOICE_KIND_NAMES: Record<InvoiceKind, string> = {
  deposit: 'Deposit',
  progress: 'Progress',
  final: 'Final',
  other: 'Other',
};

export const INVOICE_DOCUMENT_NAMES: Record<InvoiceDocumentKind, string> = {
  invoice: 'Invoice',
  'credit-note': 'Credit note',
  'payment-receipt': 'Receipt',
};

/** `Draft`, `Due`, `Part paid`, `Overdue 12 days`, `Paid`, `Credited`. */
export function standingWords(standing: InvoiceStanding, daysOverdue: number): string {
  const WORDS: Record<InvoiceStanding, string> = {
    draft: 'Draft',
    due: 'Due',
    'part-paid': 'Part paid',
    overdue: `Overdue ${daysOverdue} ${daysOverdue === 1 ? 'day' : 'days'}`,
    paid: 'Paid',
    credited: 'Credited',
  };
  return WORDS[standing];
}
