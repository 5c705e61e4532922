import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { Job } from '../jobs/jobs-public.js';
import { Member, Operation } from '../shops/shops-public.js';
import { TimeEntry } from './time-entry.entity.js';

/** An entry with its names, as the database gives it. */
export type StoredEntry = Omit<TimeEntryRow, 'startedAt' | 'endedAt' | 'voidedAt'> & {
  startedAt: Date;
  endedAt: Date | null;
  voidedAt: Date | null;
};

/** Whether the actor sees what time costs at all; without it the column is not even read. */
export const seesTimeMoney = (scope: ShopScope): boolean => scope.can('read', 'TimeEntry', 'money');

/** Entries with the names of what they point at, beside the alias `entry`. */
export function entryQuery(scope: ShopScope): ShopQuery {
  return (
    scope
      .query(TimeEntry, 'entry')
      // None of these joins takes a row away: where only rows are counted, the database leaves them out.
      .leftJoin(Member, 'member', 'member.id = entry.memberId')
      .leftJoin(Job, 'job', 'job.id = entry.jobId')
      .leftJoin(Operation, 'operation', 'operation.id = entry.operationId')
      .pick({
        id: 'entry.id',
        version: 'entry.version',
        memberId: 'entry.memberId',
        memberName: '(select person.name from person where person.id = member.person_id)',
        jobId: 'entry.jobId',
        jobNumber: 'job.number',
        jobTitle: 'job.title',
        operationId: 'entry.operationId',
        operationName: 'operation.name',
        kind: 'entry.kind',
        startedAt: 'entry.startedAt',
        endedAt: 'entry.endedAt',
        minutes: 'entry.minutes',
        note: 'entry.note',
        source: 'entry.source',
        corrected: 'entry.corrected',
        voidedAt: 'entry.voidedAt',
      })
  );
}

/** The same with costs, for who may see them. */
export function pricedEntryQuery(scope: ShopScope): ShopQuery {
  const query = entryQuery(scope);
  return seesTimeMoney(scope) ? query.pick({ costCents: 'entry.costCents' }) : query;
}

export function viewEntry(row: StoredEntry): TimeEntryRow {
  return {
    ...row,
    startedAt: row.startedAt.toISOString(),
    endedAt: row.endedAt?.toISOString() ?? null,
    voidedAt: row.voidedAt?.toISOString() ?? null,
  };
}
