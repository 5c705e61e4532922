import { addDays, startOfDay } from '@bookmatch/common/calendar/shop-dates';
import { MAX_ENTRY_MINUTES } from '@bookmatch/common/time/clock-rules';
import type { TimeEntryRow, TimeListQuery } from '@bookmatch/common/time/time-contract';
import type { Page } from '@bookmatch/common/wire/list';
import { abilitySql } from '../../platform/database/ability-sql.js';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { keysetPage, likePattern } from '../../platform/http/keyset.js';
import { shopOf } from '../shops/shops-public.js';
import { pricedEntryQuery, viewEntry, type StoredEntry } from './entry-rows.js';

const COLUMNS = { id: 'entry.id', sorts: { startedAt: 'entry.startedAt' }, standard: '-startedAt' } as const;

/** The time entries that the actor may see, voided ones among them, with costs for who may see those. */
export async function listEntries(scope: ShopScope, request: TimeListQuery): Promise<Page<TimeEntryRow>> {
  const query = pricedEntryQuery(scope);
  onlyReadableTime(scope, query);
  const { memberId, jobId, operationId, from, to, q } = request;
  if (memberId) query.where('entry.memberId = :memberId', { memberId });
  if (jobId) query.where('entry.jobId = :jobId', { jobId });
  if (operationId) query.where('entry.operationId = :operationId', { operationId });
  if (from ?? to) onlyDays(query, (await shopOf(scope)).timeZone, from, to);
  if (q)
    query.where('entry.note like :q or job.title like :q or job.number = :number', {
      q: likePattern(q),
      number: /^\d{1,9}$/.test(q) ? Number(q) : -1,
    });
  const page = await keysetPage<StoredEntry, 'startedAt'>(query, COLUMNS, request);
  return { ...page, rows: page.rows.map(viewEntry) };
}

/** Leaves only the entries that the actor may read in a query over `entry`. */
function onlyReadableTime(scope: ShopScope, query: ShopQuery): void {
  const fields = { memberId: (parameter: string) => `entry.memberId = ${parameter}` };
  const { sql, parameters } = abilitySql(scope.ability, 'read', 'TimeEntry', fields);
  query.where(sql, parameters);
}

/** Entries that share time with the days from one to another, both included, on the wall of the shop. */
function onlyDays(query: ShopQuery, zone: string, from?: string, to?: string): void {
  if (to) query.where('entry.startedAt < :before', { before: new Date(startOfDay(zone, addDays(to, 1))) });
  if (from) onlyAfter(query, new Date(startOfDay(zone, from)));
}

/** Entries that end after an instant or are open. The bound on the start lets the index find them. */
export function onlyAfter(query: ShopQuery, from: Date): void {
  const since = new Date(from.getTime() - MAX_ENTRY_MINUTES * 60_000);
  query
    .where('entry.startedAt >= :since', { since })
    .where('entry.startedAt >= :from or entry.endedAt > :from or entry.openMemberId is not null', { from });
}
