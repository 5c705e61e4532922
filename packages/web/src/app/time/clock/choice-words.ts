import { formatHours } from '@bookmatch/common/calendar/format';
import type { ClockChoice } from '@bookmatch/common/time/clock-contract';
import { jobOf, whatOf } from '../punches/work-words';

type Facts = Pick<ClockChoice, 'jobNumber' | 'jobTitle' | 'minutesLeft'>;
export type ChoiceFacts = { job: string; left: string; over: boolean };

/** The line under a choice: the job, and what is left of the plan or how far it has run over. */
export function factsOf({ jobNumber, jobTitle, minutesLeft }: Facts): ChoiceFacts {
  const job = jobOf({ kind: 'work', jobNumber, jobTitle, operationName: null });
  return { job, left: leftOf(minutesLeft, jobNumber !== null), over: (minutesLeft ?? 0) < 0 };
}

export function leftOf(minutesLeft: number | null, onJob: boolean): string {
  if (minutesLeft === null) return onJob ? 'not planned' : '';
  return minutesLeft < 0 ? `${formatHours(-minutesLeft)} over` : `${formatHours(minutesLeft)} left`;
}

export { jobOf, whatOf };
