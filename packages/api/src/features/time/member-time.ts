import { MAX_ENTRY_MINUTES, type Span } from '@bookmatch/common/time/clock-rules';
import type { ShopScope } from '../../platform/database/scope.js';
import { Member } from '../shops/shops-public.js';
import { TimeEntry } from './time-entry.entity.js';

const MINUTE_MS = 60_000;

/**
 * Locks a member's time until the transaction ends: whatever depends on their other entries comes after this. It is the
 * first thing a punch asks of the database, so that everything read later is what stands once the others are done.
 */
export function lockTimeOf(scope: ShopScope, memberId: string): Promise<Member> {
  return scope.rows(Member).getForUpdate(memberId);
}

export function openEntryOf(scope: ShopScope, memberId: string): Promise<TimeEntry | null> {
  return scope.rows(TimeEntry).findOneBy({ openMemberId: memberId });
}

/**
 * The member's other entries, voided ones left out, that may share time with a stretch. A closed entry is at most 16
 * hours long, so that those which began earlier need not be looked at; an open one may have begun at any time.
 */
export async function neighborsOf(
  scope: ShopScope,
  memberId: string,
  { from, to, except }: Neighborhood,
): Promise<Span[]> {
  const query = scope
    .query(TimeEntry, 'entry')
    .pick({ id: 'entry.id', startedAt: 'entry.startedAt', endedAt: 'entry.endedAt' })
    .where('entry.memberId = :memberId and entry.voidedAt is null', { memberId })
    .where('entry.startedAt >= :since and entry.endedAt >= :from', { since: earliest(from), from });
  if (to !== null) query.where('entry.startedAt <= :to', { to });
  const closed = await query.all<Neighbor>();
  const open = await openEntryOf(scope, memberId);
  return [...closed, ...(open ? [open] : [])].filter((entry) => !except.includes(entry.id)).map(spanOf);
}
type Neighbor = { id: string; startedAt: Date; endedAt: Date };
export type Neighborhood = { from: Date; to: Date | null; except: readonly string[] };

export function spanOf({ startedAt, endedAt }: { startedAt: Date; endedAt: Date | null }): Span {
  return { startedAt: startedAt.toISOString(), endedAt: endedAt?.toISOString() ?? null };
}

const earliest = (from: Date): Date => new Date(from.getTime() - MAX_ENTRY_MINUTES * MINUTE_MS);
