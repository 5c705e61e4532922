import type { ClockJobs, ClockState } from '@bookmatch/common/time/clock-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import { applyPunches } from '../punches/apply-punches';
import type { KeptPunch } from '../punches/punch';
import type { Waiting } from '../punches/settle-punches';
import { ClockApi, ClockPage, PunchQueue } from './clock.actions';

export type ClockSlice = {
  /** What the server said last. */
  server: ClockState | null;
  problem: Problem | null;
  /** Every job that one may clock in to; loaded with the screen, so that it is there without a network. */
  jobs: ClockJobs | null;
  /** What waits on this device, in its order. */
  punches: KeptPunch[];
  waiting: Waiting | null;
};

export const initialClock: ClockSlice = {
  server: null,
  problem: null,
  jobs: null,
  punches: [],
  waiting: null,
};

export const clockFeature = createFeature({
  name: 'clock',
  reducer: createReducer(
    initialClock,
    on(ClockApi.loaded, (state, { clock }): ClockSlice => ({ ...state, server: clock, problem: null })),
    on(ClockApi.loadFailed, (state, { problem }): ClockSlice => ({ ...state, problem })),
    on(ClockApi.jobsLoaded, (state, { jobs }): ClockSlice => ({ ...state, jobs })),
    // Shown at once; what is kept follows when the device has written it.
    on(ClockPage.punched, (state, { punch }): ClockSlice => ({
      ...state,
      punches: [...state.punches, punch],
    })),
    on(PunchQueue.changed, (state, { punches }): ClockSlice => ({
      ...state,
      punches,
      // A refused punch was answered: nothing is waited for but the person.
      waiting: punches[0]?.refused === null ? state.waiting : null,
    })),
    on(PunchQueue.waits, (state, { why }): ClockSlice => ({ ...state, waiting: why })),
    on(ClockApi.punchTaken, (state, { answer, punches }): ClockSlice => ({
      ...state,
      punches,
      ...{ server: answer.clock, problem: null, waiting: null },
    })),
  ),
  extraSelectors: ({ selectServer, selectPunches }) => {
    const selectClock = createSelector(selectServer, selectPunches, applyPunches);
    return {
      selectClock,
      selectRunning: createSelector(selectClock, ({ running }) => running),
      selectChoices: createSelector(selectServer, (server) => server?.choices ?? []),
      /** The first in the order, when the server did not take it. */
      selectRefused: createSelector(selectPunches, ([first]) =>
        first && first.refused !== null ? first : null,
      ),
      /** Something waits that may be sent: it is tried again from time to time. */
      selectTrying: createSelector(selectPunches, ([first]) => first?.refused === null),
    };
  },
});
