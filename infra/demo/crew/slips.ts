import { JOB_OPERATIONS, type JobOperation } from '../catalog/operations.js';
import { atHour } from '../calendar/wall-clock.js';
import type { Generator } from '../chance/generator.js';
import { PHASE_OF } from './phases.js';
import type { Shift } from './shift.js';

/** What went wrong at the clock on a day, to be put right on the next. */
export type Slip =
  /** Nobody clocked out; the next morning's punch closed the entry. */
  | { kind: 'forgot-out' }
  /** A stretch was clocked to another operation than it was. */
  | { kind: 'wrong-operation'; stretch: number; punched: JobOperation }
  /** The first stretch of the day was not clocked at all. */
  | { kind: 'missed-first' }
  /** Somebody touched the screen after they were done. */
  | { kind: 'stray' };

const SHARE_OF_DAYS = 0.035;

/**
 * @param overnight whether the hand's next shift is on the next calendar day: an entry left open longer than a night
 * could not be closed by a punch
 */
export function slipOf(shift: Shift, overnight: boolean, random: Generator): Slip | null {
  if (!random.chance(SHARE_OF_DAYS)) return null;
  const last = shift.stretches.at(-1);
  // 16 hours is the longest an entry can be.
  if (overnight && last && last.from >= atHour(15, 20)) return { kind: 'forgot-out' };
  return random.pick([wrongOperation(shift), { kind: 'missed-first' }, { kind: 'stray' }] as const);
}

function wrongOperation({ stretches }: Shift): Slip {
  for (const [stretch, { task }] of stretches.entries()) {
    if (task.kind !== 'job') continue;
    const { operation } = task;
    const punched = JOB_OPERATIONS.find((one) => one !== operation && PHASE_OF[one] === PHASE_OF[operation]);
    if (punched) return { kind: 'wrong-operation', stretch, punched };
  }
  return { kind: 'stray' };
}
