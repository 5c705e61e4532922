import { createSelector } from '@ngrx/store';
import { invoiceList, invoicesFeature, paymentList } from './invoices.state';

const { selectList, selectPayments, selectOpened } = invoicesFeature;

export const { selectOpenProblem, selectSave, selectTotals, selectAging } = invoicesFeature;

/** All that the list's screen shows. */
export const selectInvoiceList = createSelector(selectList, (list) => ({
  rows: invoiceList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectPaymentList = createSelector(selectPayments, (list) => ({
  rows: paymentList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectInvoice = (id: string) =>
  createSelector(selectOpened, ({ entities }) => entities[id] ?? null);
