/** What other slices and `compose.ts` may use of `invoices`. */
export { Invoice } from './invoice.entity.js';
export type { CardPayments } from './card-payments.js';
export { customerInvoice } from './customer-invoice.js';
export { customerOfInvoice } from './customer-of-invoice.js';
export { earnDeposits } from './earned-deposits.js';
export { creditNoteDocument, invoiceDocument, receiptDocument } from './invoice-documents.js';
export {
  createInvoiceServices,
  invoicesOutbox,
  invoicesPaymentEvents,
  type InvoiceServices,
} from './invoice-services.js';
export { firstInvoices } from './invoice-lists.js';
export { jobInvoices } from './job-invoices.js';
export { paymentsSince } from './payment-lists.js';
export { countOverdue, owedUntil, readAging, readTotals } from './receivables.js';
