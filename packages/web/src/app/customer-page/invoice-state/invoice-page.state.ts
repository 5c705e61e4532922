import type { CustomerInvoice } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { InvoicePage, InvoicePageServer, type Arrival } from './invoice-page.actions';

export type InvoicePageState = {
  invoice: CustomerInvoice | null;
  arrival: Arrival;
  /** `opening`: on the way to the provider's page. `confirming`: back from it, and the shop has not heard yet. */
  payment: 'idle' | 'opening' | 'confirming' | 'unheard';
  problem: Problem | null;
};

export const initialInvoicePage: InvoicePageState = {
  invoice: null,
  arrival: 'by-link',
  payment: 'idle',
  problem: null,
};

/** What the customer is told about a payment by card. */
export type PaymentNews = 'none' | 'paid' | 'confirming' | 'unheard' | 'canceled';

export const invoicePageFeature = createFeature({
  name: 'invoicePage',
  reducer: createReducer(
    initialInvoicePage,
    on(InvoicePage.opened, (_, { invoice, arrival }): InvoicePageState => ({
      invoice,
      arrival,
      payment: arrival === 'paid' && invoice.balanceCents > 0 ? 'confirming' : 'idle',
      problem: null,
    })),
    on(InvoicePage.payPressed, (state): InvoicePageState => ({
      ...state,
      payment: 'opening',
      problem: null,
    })),
    on(InvoicePageServer.paymentRefused, (state, { problem }): InvoicePageState => ({
      ...state,
      payment: 'idle',
      problem,
    })),
    on(InvoicePage.checkPressed, (state): InvoicePageState => ({ ...state, payment: 'confirming' })),
    on(InvoicePageServer.checked, (state, { invoice }): InvoicePageState => ({
      ...state,
      invoice,
      payment: invoice.balanceCents > 0 ? state.payment : 'idle',
    })),
    on(InvoicePageServer.checkingGivenUp, (state): InvoicePageState => ({ ...state, payment: 'unheard' })),
  ),
  extraSelectors: ({ selectInvoice, selectArrival, selectPayment }) => ({
    selectNews: createSelector(selectInvoice, selectArrival, selectPayment, newsOf),
  }),
});

function newsOf(
  invoice: CustomerInvoice | null,
  arrival: Arrival,
  payment: InvoicePageState['payment'],
): PaymentNews {
  if (payment === 'confirming' || payment === 'unheard') return payment;
  if (arrival === 'paid' && invoice?.balanceCents === 0) return 'paid';
  return arrival === 'canceled' && (invoice?.balanceCents ?? 0) > 0 ? 'canceled' : 'none';
}
