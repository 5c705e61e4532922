import { createSelector } from '@ngrx/store';
import { customerList, customersFeature } from './customers.state';

const { selectList, selectOpened } = customersFeature;

export const { selectOpenProblem, selectSave, selectSiteSave } = customersFeature;

/** All that the list's screen shows. */
export const selectCustomerList = createSelector(selectList, (list) => ({
  rows: customerList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectCustomer = (id: string) =>
  createSelector(selectOpened, ({ entities }) => entities[id] ?? null);
