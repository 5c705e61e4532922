import type { CustomerEstimate, CustomerPage } from '@bookmatch/common/customer-page/customer-page-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { CustomerPageApi, CustomerScreen } from './customer-page.actions';

export type CustomerPageState = {
  page: CustomerPage | null;
  problem: Problem | null;
  /** The customer's yes or no. */
  answer: SaveState;
  question: SaveState;
};

export const initialCustomerPage: CustomerPageState = {
  page: null,
  problem: null,
  answer: notSaved,
  question: notSaved,
};

export const customerPageFeature = createFeature({
  name: 'customerPage',
  reducer: createReducer(
    initialCustomerPage,
    on(CustomerScreen.opened, (state): CustomerPageState => ({ ...state, problem: null, answer: notSaved })),
    on(CustomerPageApi.loaded, (state, { page }): CustomerPageState => ({ ...state, page })),
    on(CustomerPageApi.loadFailed, (state, { problem }): CustomerPageState => ({
      ...state,
      page: null,
      problem,
    })),
    on(CustomerScreen.accepted, CustomerScreen.declined, (state): CustomerPageState => ({
      ...state,
      answer: saving,
    })),
    on(CustomerPageApi.answered, (state, { estimate }): CustomerPageState => ({
      ...withEstimate(state, () => estimate),
      answer: saved,
    })),
    on(CustomerPageApi.answerFailed, (state, { problem }): CustomerPageState => ({
      ...state,
      answer: saveFailed(problem),
    })),
    on(CustomerScreen.asked, (state): CustomerPageState => ({ ...state, question: saving })),
    on(CustomerPageApi.questionKept, (state, { question }): CustomerPageState => ({
      ...withEstimate(state, (estimate) => ({
        ...estimate,
        questions: [...estimate.questions, question],
      })),
      question: saved,
    })),
    on(CustomerPageApi.questionFailed, (state, { problem }): CustomerPageState => ({
      ...state,
      question: saveFailed(problem),
    })),
  ),
  extraSelectors: ({ selectPage }) => ({
    /** The customer reads times as the shop does. */
    selectZone: createSelector(selectPage, (page) => page?.shop.timeZone ?? 'UTC'),
    selectCurrency: createSelector(selectPage, (page) => {
      if (!page) return 'USD';
      return page.subject === 'estimate' ? page.estimate.document.currency : page.invoice.currency;
    }),
  }),
});

function withEstimate(
  state: CustomerPageState,
  change: (estimate: CustomerEstimate) => CustomerEstimate,
): CustomerPageState {
  if (state.page?.subject !== 'estimate') return state;
  return { ...state, page: { ...state.page, estimate: change(state.page.estimate) } };
}
