import type { JobOperation } from '../catalog/operations.js';
import type { WallMinute } from '../calendar/wall-clock.js';
import type { WorkdayIndex } from '../plan/project.js';
import type { Hand } from './hands.js';

/** What a stretch of a day goes to: an operation of a job, the shop itself, or a meal. */
export type Task =
  { kind: 'job'; project: string; operation: JobOperation } | { kind: 'shop' } | { kind: 'meal' };

export type Stretch = { from: WallMinute; to: WallMinute; task: Task };

/** One hand's day, in order and without gaps: each stretch begins where the one before ends. */
export type Shift = { hand: Hand; day: WorkdayIndex; stretches: Stretch[] };

export function sameTask(one: Task, other: Task): boolean {
  if (one.kind !== 'job' || other.kind !== 'job') return one.kind === other.kind;
  return one.project === other.project && one.operation === other.operation;
}
