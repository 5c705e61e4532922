import { createSelector } from '@ngrx/store';
import { activityList, entryList, ledgerFeature } from './ledger.state';

const { selectEntries, selectActivity, selectOpened } = ledgerFeature;

export const { selectBalance, selectBalanceProblem, selectOpenProblem, selectActivityHead } = ledgerFeature;

export const selectEntryList = createSelector(selectEntries, (list) => ({
  rows: entryList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectActivityList = createSelector(selectActivity, (list) => ({
  rows: activityList.selectRows(list),
  loading: list.status === 'idle' || list.status === 'loading',
  problem: list.problem,
  next: list.next,
  total: list.total,
}));

export const selectEntry = (id: string) =>
  createSelector(selectOpened, ({ entities }) => entities[id] ?? null);
