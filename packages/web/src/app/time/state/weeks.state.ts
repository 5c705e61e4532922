import type { ClockJobs } from '@bookmatch/common/time/clock-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { TimeEntry, TimeEntryRow } from '@bookmatch/common/time/time-contract';
import type { MemberWeek, ShopWeek } from '@bookmatch/common/time/week-contract';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { WeeksApi, WeeksPage } from './weeks.actions';

export type Opened<Value> = { value: Value | null; problem: Problem | null };

export type WeeksState = {
  memberWeek: Opened<MemberWeek>;
  shopWeek: Opened<ShopWeek>;
  list: ListState<TimeEntryRow>;
  /** The entry of the open form, with its history. */
  entry: TimeEntry | null;
  save: SaveState;
  /** What an entry can be put on. */
  work: ClockJobs | null;
};

export const entryList = createListState<TimeEntryRow>();
const nothing = { value: null, problem: null };

export const initialWeeks: WeeksState = {
  memberWeek: nothing,
  shopWeek: nothing,
  list: entryList.initial,
  entry: null,
  save: notSaved,
  work: null,
};

export const weeksFeature = createFeature({
  name: 'weeks',
  reducer: createReducer(
    initialWeeks,
    // The week of somebody else is not left on the screen while theirs is on its way; another week of the same is.
    on(WeeksPage.memberWeekOpened, (state, { memberId }): WeeksState => ({
      ...state,
      memberWeek: {
        value:
          memberId === null || state.memberWeek.value?.memberId === memberId ? state.memberWeek.value : null,
        problem: null,
      },
    })),
    on(WeeksApi.memberWeekLoaded, (state, { week }): WeeksState => ({
      ...state,
      memberWeek: { value: week, problem: null },
    })),
    on(WeeksApi.memberWeekFailed, (state, { problem }): WeeksState => ({
      ...state,
      memberWeek: { value: null, problem },
    })),
    on(WeeksPage.shopWeekOpened, (state): WeeksState => ({
      ...state,
      shopWeek: { ...state.shopWeek, problem: null },
    })),
    on(WeeksApi.shopWeekLoaded, (state, { week }): WeeksState => ({
      ...state,
      shopWeek: { value: week, problem: null },
    })),
    on(WeeksApi.shopWeekFailed, (state, { problem }): WeeksState => ({
      ...state,
      shopWeek: { value: null, problem },
    })),
    on(WeeksPage.listOpened, (state): WeeksState => ({ ...state, list: entryList.requested(state.list) })),
    on(WeeksApi.listLoaded, (state, { page }): WeeksState => ({
      ...state,
      list: entryList.loaded(state.list, page),
    })),
    on(WeeksApi.listFailed, (state, { problem }): WeeksState => ({
      ...state,
      list: entryList.failed(state.list, problem),
    })),
    on(WeeksPage.formOpened, (state): WeeksState => ({ ...state, entry: null, save: notSaved })),
    on(WeeksApi.entryLoaded, (state, { entry }): WeeksState => ({ ...state, entry })),
    on(WeeksApi.entryFailed, (state, { problem }): WeeksState => ({ ...state, save: saveFailed(problem) })),
    on(WeeksPage.addSubmitted, WeeksPage.correctionSubmitted, (state): WeeksState => ({
      ...state,
      save: saving,
    })),
    on(WeeksApi.saved, (state, { entry }): WeeksState => ({
      ...withEntry(state, entry),
      save: saved,
    })),
    on(WeeksApi.saveFailed, (state, { problem }): WeeksState => ({ ...state, save: saveFailed(problem) })),
    on(WeeksApi.voided, (state, { entry }): WeeksState => withEntry(state, entry)),
    on(WeeksApi.workLoaded, (state, { work }): WeeksState => ({ ...state, work })),
  ),
  extraSelectors: ({ selectList }) => ({
    selectEntryList: createSelector(selectList, (list) => ({
      rows: entryList.selectRows(list),
      loading: list.status === 'idle' || list.status === 'loading',
      problem: list.problem,
      next: list.next,
      total: list.total,
    })),
  }),
});

/** The week is read again for its sums; the list only needs the one row. */
function withEntry(state: WeeksState, { corrections: _history, ...row }: TimeEntry): WeeksState {
  return { ...state, list: entryList.changed(state.list, row) };
}
