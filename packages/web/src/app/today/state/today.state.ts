import type { Problem } from '@bookmatch/common/problems/problem';
import type { Today } from '@bookmatch/common/today/today-contract';
import { createFeature, createReducer, on } from '@ngrx/store';
import { TodayApi, TodayPage } from './today.actions';

/** The page as it was read last stays while it is read again. */
export type TodayState = { page: Today | null; problem: Problem | null };

export const initialToday: TodayState = { page: null, problem: null };

export const todayFeature = createFeature({
  name: 'today',
  reducer: createReducer(
    initialToday,
    on(TodayPage.opened, (state): TodayState => ({ ...state, problem: null })),
    on(TodayApi.loaded, (_, { page }): TodayState => ({ page, problem: null })),
    on(TodayApi.failed, (state, { problem }): TodayState => ({ ...state, problem })),
  ),
});
