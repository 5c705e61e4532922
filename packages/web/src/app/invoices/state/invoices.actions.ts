import type { Aging } from '@bookmatch/common/invoices/aging-contract';
import type {
  CreateInvoice,
  CreditInvoice,
  Invoice,
  InvoiceListTotals,
  InvoiceRow,
  PaymentRow,
  RecordPayment,
  RefundOverpayment,
  SendInvoice,
  UpdateInvoice,
} from '@bookmatch/common/invoices/invoices-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';
import type { InvoiceRef, LetterSubject } from '../invoices-api';

/** What happened on the screens. */
export const InvoicesPage = createActionGroup({
  source: 'Invoices Page',
  events: {
    listOpened: props<{ query: ListQuery }>(),
    totalsWanted: emptyProps(),
    agingOpened: props<{ query: ListQuery }>(),
    paymentsOpened: props<{ query: ListQuery }>(),
    invoiceOpened: props<{ id: string }>(),
    formOpened: emptyProps(),
    createSubmitted: props<{ fields: CreateInvoice }>(),
    editSubmitted: props<{ invoice: InvoiceRef; fields: UpdateInvoice }>(),
    deletionConfirmed: props<{ invoice: InvoiceRef }>(),
    issueSubmitted: props<{ invoice: InvoiceRef }>(),
    issueAndSendSubmitted: props<{ invoice: InvoiceRef; letter: SendInvoice }>(),
    sendSubmitted: props<{ invoice: InvoiceRef; letter: SendInvoice }>(),
    paymentSubmitted: props<{ invoice: InvoiceRef; payment: RecordPayment }>(),
    refundSubmitted: props<{ invoice: InvoiceRef; refund: RefundOverpayment }>(),
    creditSubmitted: props<{ invoice: InvoiceRef; credit: CreditInvoice }>(),
    reversalConfirmed: props<{ paymentId: string; reason: string }>(),
    letterSubmitted: props<{ invoiceId: string; subject: LetterSubject; to: string }>(),
    linkWanted: props<{ invoiceId: string }>(),
  },
});

/** What the server said. */
export const InvoicesApi = createActionGroup({
  source: 'Invoices API',
  events: {
    listLoaded: props<{ page: Page<InvoiceRow> }>(),
    listFailed: props<{ problem: Problem }>(),
    totalsLoaded: props<{ totals: InvoiceListTotals }>(),
    /** The head of the list goes without its sums; the list itself says what is wrong. */
    totalsFailed: emptyProps(),
    agingLoaded: props<{ aging: Aging }>(),
    agingFailed: props<{ problem: Problem }>(),
    paymentsLoaded: props<{ page: Page<PaymentRow> }>(),
    paymentsFailed: props<{ problem: Problem }>(),
    invoiceLoaded: props<{ invoice: Invoice }>(),
    invoiceFailed: props<{ problem: Problem }>(),
    created: props<{ invoice: Invoice }>(),
    edited: props<{ invoice: Invoice }>(),
    removed: props<{ id: string }>(),
    /** First half of issuing and sending: from here on only the letter is missing. */
    issuedFirst: props<{ invoice: Invoice }>(),
    /** A command of a dialog was done, in words for the person. */
    done: props<{ invoice: Invoice; message: string }>(),
    letterSent: props<{ invoiceId: string }>(),
    saveFailed: props<{ problem: Problem }>(),
    linkMade: props<{ url: string }>(),
    /** A command without a form of its own was refused. */
    commandFailed: props<{ problem: Problem }>(),
  },
});
