import { punchMinute } from '@bookmatch/common/time/punch';
import type { CorrectTimeEntry, TimeEntryFacts } from '@bookmatch/common/time/time-contract';
import type { TimeEntry } from './time-entry.entity.js';

/** What a correction can change, as the database holds it. */
export type StoredFacts = Pick<
  TimeEntry,
  'jobId' | 'operationId' | 'kind' | 'startedAt' | 'endedAt' | 'note'
>;

export function factsOf({ jobId, operationId, kind, startedAt, endedAt, note }: StoredFacts): TimeEntryFacts {
  return {
    ...{ jobId, operationId, kind, note },
    startedAt: startedAt.toISOString(),
    endedAt: endedAt?.toISOString() ?? null,
  };
}

/** The entry's facts with what was typed put in. Time made a meal break is of no job and no operation. */
export function corrected(entry: StoredFacts, typed: Omit<CorrectTimeEntry, 'reason'>): StoredFacts {
  const { kind = entry.kind, note = entry.note } = typed;
  const work = kind === 'meal-break' ? { jobId: null, operationId: null } : entry;
  const { jobId = work.jobId, operationId = work.operationId } = typed;
  return {
    ...{ jobId, operationId, kind, note },
    startedAt: minute(typed.startedAt) ?? entry.startedAt,
    endedAt: minute(typed.endedAt) ?? entry.endedAt,
  };
}

const minute = (at: string | undefined): Date | undefined =>
  at === undefined ? undefined : new Date(punchMinute(at));
