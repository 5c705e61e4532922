import type { Aging } from '@bookmatch/common/invoices/aging-contract';
import type {
  Invoice,
  InvoiceListTotals,
  InvoiceRow,
  PaymentRow,
} from '@bookmatch/common/invoices/invoices-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { InvoicesApi, InvoicesPage } from './invoices.actions';

export type InvoicesState = {
  list: ListState<InvoiceRow>;
  totals: InvoiceListTotals | null;
  aging: { report: Aging | null; problem: Problem | null };
  payments: ListState<PaymentRow>;
  opened: EntityState<Invoice>;
  openProblem: Problem | null;
  /** The one form or dialog that is open. */
  save: SaveState;
};

export const invoiceList = createListState<InvoiceRow>();
export const paymentList = createListState<PaymentRow>();
export const openedInvoices = createEntityAdapter<Invoice>();

export const initialInvoices: InvoicesState = {
  list: invoiceList.initial,
  totals: null,
  aging: { report: null, problem: null },
  payments: paymentList.initial,
  opened: openedInvoices.getInitialState(),
  openProblem: null,
  save: notSaved,
};

export const invoicesFeature = createFeature({
  name: 'invoices',
  reducer: createReducer(
    initialInvoices,
    on(InvoicesPage.listOpened, (state): InvoicesState => ({
      ...state,
      list: invoiceList.requested(state.list),
    })),
    on(InvoicesApi.listLoaded, (state, { page }): InvoicesState => ({
      ...state,
      list: invoiceList.loaded(state.list, page),
    })),
    on(InvoicesApi.listFailed, (state, { problem }): InvoicesState => ({
      ...state,
      list: invoiceList.failed(state.list, problem),
    })),
    on(InvoicesApi.totalsLoaded, (state, { totals }): InvoicesState => ({ ...state, totals })),
    on(InvoicesApi.agingLoaded, (state, { aging }): InvoicesState => ({
      ...state,
      aging: { report: aging, problem: null },
    })),
    on(InvoicesApi.agingFailed, (state, { problem }): InvoicesState => ({
      ...state,
      aging: { report: null, problem },
    })),
    on(InvoicesPage.paymentsOpened, (state): InvoicesState => ({
      ...state,
      payments: paymentList.requested(state.payments),
    })),
    on(InvoicesApi.paymentsLoaded, (state, { page }): InvoicesState => ({
      ...state,
      payments: paymentList.loaded(state.payments, page),
    })),
    on(InvoicesApi.paymentsFailed, (state, { problem }): InvoicesState => ({
      ...state,
      payments: paymentList.failed(state.payments, problem),
    })),
    on(InvoicesPage.invoiceOpened, (state): InvoicesState => ({ ...state, openProblem: null })),
    on(InvoicesApi.invoiceFailed, (state, { problem }): InvoicesState => ({
      ...state,
      openProblem: problem,
    })),
    on(InvoicesApi.invoiceLoaded, InvoicesApi.issuedFirst, (state, { invoice }): InvoicesState =>
      withInvoice(state, invoice),
    ),
    on(InvoicesPage.formOpened, (state): InvoicesState => ({ ...state, save: notSaved })),
    on(
      InvoicesPage.createSubmitted,
      InvoicesPage.editSubmitted,
      InvoicesPage.issueSubmitted,
      InvoicesPage.issueAndSendSubmitted,
      InvoicesPage.sendSubmitted,
      InvoicesPage.paymentSubmitted,
      InvoicesPage.refundSubmitted,
      InvoicesPage.creditSubmitted,
      InvoicesPage.letterSubmitted,
      (state): InvoicesState => ({ ...state, save: saving }),
    ),
    on(InvoicesApi.created, InvoicesApi.edited, InvoicesApi.done, (state, { invoice }): InvoicesState => ({
      ...withInvoice(state, invoice),
      save: saved,
    })),
    on(InvoicesApi.letterSent, (state): InvoicesState => ({ ...state, save: saved })),
    on(InvoicesApi.saveFailed, (state, { problem }): InvoicesState => ({
      ...state,
      save: saveFailed(problem),
    })),
    on(InvoicesApi.removed, (state, { id }): InvoicesState => ({
      ...state,
      opened: openedInvoices.removeOne(id, state.opened),
    })),
  ),
});

function withInvoice(state: InvoicesState, invoice: Invoice): InvoicesState {
  return { ...state, opened: openedInvoices.setOne(invoice, state.opened) };
}
