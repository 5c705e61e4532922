import type { Correction, TimeEntry as TimeEntryView } from '@bookmatch/common/time/time-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { notFound } from '../../platform/http/problem-error.js';
import { memberNames } from '../shops/shops-public.js';
import { pricedEntryQuery, viewEntry, type StoredEntry } from './entry-rows.js';
import { TimeCorrection } from './time-correction.entity.js';

/** One entry with what was done to it afterwards, oldest first. */
export async function viewEntryWithHistory(scope: ShopScope, id: string): Promise<TimeEntryView> {
  const row = await pricedEntryQuery(scope).where('entry.id = :id', { id }).first<StoredEntry>();
  if (!row) throw notFound('This time entry');
  return { ...viewEntry(row), corrections: row.corrected ? await historyOf(scope, id) : [] };
}

async function historyOf(scope: ShopScope, entryId: string): Promise<Correction[]> {
  const [rows, names] = await Promise.all([
    scope.rows(TimeCorrection).findBy({ entryId }, 'createdAt'),
    memberNames(scope),
  ]);
  return rows.map(({ createdAt, memberId, reason, before, after }) => ({
    ...{ reason, before, after },
    at: createdAt.toISOString(),
    by: names.get(memberId) ?? '',
  }));
}
