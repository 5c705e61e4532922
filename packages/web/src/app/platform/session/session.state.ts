import type { Session } from '@bookmatch/common/accounts/accounts-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { SessionApi, SessionPage } from './session.actions';

export type SessionState = {
  /** The shop of the address. */
  slug: string | null;
  status: 'loading' | 'signed-in' | 'signed-out' | 'failed';
  session: Session | null;
  problem: Problem | null;
};

export const initialSession: SessionState = { slug: null, status: 'loading', session: null, problem: null };

export const sessionFeature = createFeature({
  name: 'session',
  reducer: createReducer(
    initialSession,
    on(SessionPage.started, (_, { slug }): SessionState => ({ ...initialSession, slug })),
    on(SessionApi.loaded, (state, { session }): SessionState => ({
      ...state,
      status: 'signed-in',
      session,
      problem: null,
    })),
    on(SessionApi.missing, (state): SessionState => ({ ...state, status: 'signed-out', session: null })),
    on(SessionApi.loadFailed, (state, { problem }): SessionState => ({
      ...state,
      status: 'failed',
      problem,
    })),
    on(SessionPage.nameChanged, (state, { name }): SessionState => renamed(state, name)),
  ),
  extraSelectors: ({ selectSlug, selectSession }) => {
    const selectPerson = createSelector(selectSession, (session) => session?.person ?? null);
    const selectMemberships = createSelector(selectSession, (session) => session?.memberships ?? []);
    const selectMembership = createSelector(
      selectMemberships,
      selectSlug,
      (memberships, slug) => memberships.find((membership) => membership.slug === slug) ?? null,
    );
    const selectRole = createSelector(selectMembership, (membership) => membership?.role ?? null);
    return { selectPerson, selectMemberships, selectMembership, selectRole };
  },
});

function renamed(state: SessionState, name: string): SessionState {
  if (!state.session) return state;
  const person = { ...state.session.person, name };
  return { ...state, session: { ...state.session, person } };
}
