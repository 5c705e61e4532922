import type { InstantText } from '@bookmatch/common/calendar/shop-dates';
import type { ClockChoice } from '@bookmatch/common/time/clock-contract';
import type { TimeKind } from '@bookmatch/common/time/time-contract';

/** What time is clocked to, with its names, so that it can be read without a network. */
export type PunchedWork = Omit<ClockChoice, 'minutesLeft' | 'recent' | 'operationId' | 'operationName'> & {
  kind: TimeKind;
  operationId: string | null;
  operationName: string | null;
};

type Pressed = {
  /** Grows with every punch on this device: punches are sent in this order. */
  order: number;
  /** When the button was pressed. */
  at: InstantText;
  entryId: string;
  work: PunchedWork;
};
/** Clock in, or switch. `before` is the entry that was open then, by what this device knew. */
export type PunchIn = Pressed & { type: 'in'; source: 'phone' | 'desk'; before: string | null };
export type PunchOut = Pressed & { type: 'out' };
export type Punch = PunchIn | PunchOut;

/** A punch that waits on this device. The server's sentence stands in `refused` when it did not take it. */
export type KeptPunch = Punch & { refused: string | null };

export const MEAL_BREAK: PunchedWork = {
  kind: 'meal-break',
  jobId: null,
  jobNumber: null,
  jobTitle: null,
  operationId: null,
  operationName: null,
};

export function workOf(choice: Omit<ClockChoice, 'minutesLeft' | 'recent'>): PunchedWork {
  const { jobId, jobNumber, jobTitle, operationId, operationName } = choice;
  return { kind: 'work', jobId, jobNumber, jobTitle, operationId, operationName };
}

export function isSameWork(a: PunchedWork, b: PunchedWork): boolean {
  return a.kind === b.kind && a.jobId === b.jobId && a.operationId === b.operationId;
}
