import type { OwnSession } from '@bookmatch/common/accounts/accounts-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { OwnSessionsApi, OwnSessionsPage } from './own-sessions.actions';

export type OwnSessionsState = EntityState<OwnSession> & { loaded: boolean; problem: Problem | null };

/** Here first, then the one seen last. */
const adapter = createEntityAdapter<OwnSession>({
  sortComparer: (a, b) => Number(b.current) - Number(a.current) || b.lastSeenAt.localeCompare(a.lastSeenAt),
});
const { selectAll } = adapter.getSelectors();

export const initialOwnSessions: OwnSessionsState = adapter.getInitialState({ loaded: false, problem: null });

export const ownSessionsFeature = createFeature({
  name: 'ownSessions',
  reducer: createReducer(
    initialOwnSessions,
    on(OwnSessionsPage.opened, (state): OwnSessionsState => ({ ...state, problem: null })),
    on(OwnSessionsApi.loaded, (state, { sessions }): OwnSessionsState =>
      adapter.setAll(sessions, { ...state, loaded: true }),
    ),
    on(OwnSessionsApi.loadFailed, (state, { problem }): OwnSessionsState => ({ ...state, problem })),
    on(OwnSessionsApi.ended, (state, { id }): OwnSessionsState => adapter.removeOne(id, state)),
  ),
  extraSelectors: ({ selectOwnSessionsState }) => ({
    selectSessions: createSelector(selectOwnSessionsState, (state) => selectAll(state)),
  }),
});
