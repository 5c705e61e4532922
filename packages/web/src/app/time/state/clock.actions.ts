import type { InstantText } from '@bookmatch/common/calendar/shop-dates';
import type { ClockJobs, ClockState, Punched } from '@bookmatch/common/time/clock-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { KeptPunch, PunchedWork } from '../punches/punch';
import type { Waiting } from '../punches/settle-punches';

/** What happened at the clock, on the phone's screen or in the frame. */
export const ClockPage = createActionGroup({
  source: 'Clock Page',
  events: {
    opened: emptyProps(),
    /** The page was looked at again, or the network came back: what is shown may be old. */
    woken: emptyProps(),
    jobsWanted: emptyProps(),
    punched: props<{ punch: KeptPunch }>(),
    sendPressed: emptyProps(),
    refusedPutOn: props<{ order: number; work: PunchedWork }>(),
    refusedMoved: props<{ order: number; at: InstantText }>(),
    refusedLetGo: props<{ order: number }>(),
  },
});

/** What happened to the punches that wait on this device. */
export const PunchQueue = createActionGroup({
  source: 'Punch Queue',
  events: {
    changed: props<{ punches: KeptPunch[] }>(),
    retryDue: emptyProps(),
    waits: props<{ why: Waiting }>(),
  },
});

/** What the server said. */
export const ClockApi = createActionGroup({
  source: 'Clock API',
  events: {
    loaded: props<{ clock: ClockState }>(),
    loadFailed: props<{ problem: Problem }>(),
    jobsLoaded: props<{ jobs: ClockJobs }>(),
    jobsFailed: props<{ problem: Problem }>(),
    punchTaken: props<{ answer: Punched; punches: KeptPunch[] }>(),
  },
});
