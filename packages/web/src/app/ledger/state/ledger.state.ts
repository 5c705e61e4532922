import type {
  AccountActivity,
  AccountActivityRow,
  LedgerEntry,
  TrialBalance,
} from '@bookmatch/common/ledger/ledger-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, on } from '@ngrx/store';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { LedgerApi, LedgerPage } from './ledger.actions';

/** A row of a list needs an id: the entry's serves, since an entry touches an account once. */
export type ActivityRow = AccountActivityRow & { id: string };
export type ActivityHead = Omit<AccountActivity, 'rows' | 'next' | 'total'>;
export type LedgerState = {
  balance: TrialBalance | null;
  balanceProblem: Problem | null;
  entries: ListState<LedgerEntry>;
  opened: EntityState<LedgerEntry>;
  openProblem: Problem | null;
  activity: ListState<ActivityRow>;
  activityHead: ActivityHead | null;
};

export const entryList = createListState<LedgerEntry>();
export const activityList = createListState<ActivityRow>();
export const openedEntries = createEntityAdapter<LedgerEntry>();

export const initialLedger: LedgerState = {
  balance: null,
  balanceProblem: null,
  entries: entryList.initial,
  opened: openedEntries.getInitialState(),
  openProblem: null,
  activity: activityList.initial,
  activityHead: null,
};

export const ledgerFeature = createFeature({
  name: 'ledger',
  reducer: createReducer(
    initialLedger,
    on(LedgerPage.balanceOpened, (state): LedgerState => ({ ...state, balanceProblem: null })),
    on(LedgerApi.balanceLoaded, (state, { balance }): LedgerState => ({ ...state, balance })),
    on(LedgerApi.balanceFailed, (state, { problem }): LedgerState => ({ ...state, balanceProblem: problem })),
    on(LedgerPage.entriesOpened, (state): LedgerState => ({
      ...state,
      entries: entryList.requested(state.entries),
    })),
    on(LedgerApi.entriesLoaded, (state, { page }): LedgerState => ({
      ...state,
      entries: entryList.loaded(state.entries, page),
    })),
    on(LedgerApi.entriesFailed, (state, { problem }): LedgerState => ({
      ...state,
      entries: entryList.failed(state.entries, problem),
    })),
    on(LedgerPage.entryOpened, (state): LedgerState => ({ ...state, openProblem: null })),
    on(LedgerApi.entryLoaded, (state, { entry }): LedgerState => ({
      ...state,
      opened: openedEntries.setOne(entry, state.opened),
    })),
    on(LedgerApi.entryFailed, (state, { problem }): LedgerState => ({ ...state, openProblem: problem })),
    on(LedgerPage.activityOpened, (state, { code }): LedgerState =>
      // Another account starts empty: its rows must not stand under this one's head.
      state.activityHead?.account === code
        ? { ...state, activity: activityList.requested(state.activity) }
        : { ...state, activity: activityList.requested(activityList.initial), activityHead: null },
    ),
    on(LedgerApi.activityLoaded, (state, { activity }): LedgerState => withActivity(state, activity)),
    on(LedgerApi.activityFailed, (state, { problem }): LedgerState => ({
      ...state,
      activity: activityList.failed(state.activity, problem),
    })),
  ),
});

function withActivity(state: LedgerState, activity: AccountActivity): LedgerState {
  const { rows, next, total, ...activityHead } = activity;
  const page = {
    rows: rows.map((row) => ({ ...row, id: row.entryId })),
    next,
    ...(total === undefined ? {} : { total }),
  };
  return { ...state, activity: activityList.loaded(state.activity, page), activityHead };
}
