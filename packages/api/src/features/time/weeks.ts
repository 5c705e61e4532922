import { addDays, weekStart } from '@bookmatch/common/calendar/shop-dates';
import { costedParts } from '@bookmatch/common/time/entry-parts';
import { weekBounds, weekDays, weekTotals, type Stretch } from '@bookmatch/common/time/shop-week';
import type { MemberWeek, ShopWeek, WeekQuery } from '@bookmatch/common/time/week-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { notFound } from '../../platform/http/problem-error.js';
import { Member, shopOf, todayAt } from '../shops/shops-public.js';
import { pricedEntryQuery, seesTimeMoney, viewEntry, type StoredEntry } from './entry-rows.js';
import { onlyAfter } from './time-lists.js';
import { TimeEntry } from './time-entry.entity.js';

export type WeekFrame = { startsOn: string; endsOn: string; timeZone: string; from: Date; to: Date };

/** The workweek that holds a day, or the current one. */
export async function weekFrame(scope: ShopScope, { of }: WeekQuery): Promise<WeekFrame> {
  const shop = await shopOf(scope);
  const { timeZone } = shop;
  const startsOn = weekStart(of ?? todayAt(shop, scope.now));
  const { from, to } = weekBounds(startsOn, timeZone);
  return { startsOn, endsOn: addDays(startsOn, 6), timeZone, from: new Date(from), to: new Date(to) };
}

/** Leaves only entries that share time with the week in a query over `entry`. */
export function onlyWeek(query: ShopQuery, { from, to }: WeekFrame): ShopQuery {
  onlyAfter(query.where('entry.startedAt < :to', { to }), from);
  return query;
}

/** One member's week with its entries, oldest first. @throws not-found for a member whose time the actor may not read */
export async function memberWeek(scope: ShopScope, memberId: string, query: WeekQuery): Promise<MemberWeek> {
  scope.check('read', 'TimeEntry', { memberId });
  const frame = await weekFrame(scope, query);
  const [member, rows] = await Promise.all([memberOf(scope, memberId), entriesOf(scope, memberId, frame)]);
  const days = weekDays(countedOf(rows), frame.startsOn, frame.timeZone);
  return {
    ...{ memberId, memberName: member.name, ...weekTotals(days), days },
    ...{ startsOn: frame.startsOn, endsOn: frame.endsOn, timeZone: frame.timeZone },
    entries: rows.map(viewEntry),
  };
}

/** Everybody's week: a row for each member, and for those who left and still have time in it. */
export async function shopWeek(scope: ShopScope, query: WeekQuery): Promise<ShopWeek> {
  const frame = await weekFrame(scope, query);
  const money = seesTimeMoney(scope);
  const [members, entries] = await Promise.all([membersOf(scope), countedEntries(scope, frame, { money })]);
  const worked = new Set(entries.map((entry) => entry.memberId));
  const rows = members
    .filter((member) => member.removedAt === null || worked.has(member.id))
    .map((member) => ({
      ...{ memberId: member.id, memberName: member.name, role: member.role },
      ...weekOf(
        entries.filter((entry) => entry.memberId === member.id),
        frame,
        { money },
      ),
    }));
  const { startsOn, endsOn, timeZone } = frame;
  const workMinutes = rows.reduce((sum, row) => sum + row.workMinutes, 0);
  return { startsOn, endsOn, timeZone, members: rows, workMinutes };
}

/** Work of everybody in the current workweek, in closed entries. */
export async function workMinutesThisWeek(scope: ShopScope): Promise<number> {
  const frame = await weekFrame(scope, {});
  const entries = await countedEntries(scope, frame, { money: false });
  return weekTotals(weekDays(countedOf(entries), frame.startsOn, frame.timeZone)).workMinutes;
}

/** Whether costs are read at all. */
type Shown = { money: boolean };
type Counted = Pick<TimeEntry, 'memberId' | 'kind' | 'startedAt' | 'endedAt'> & { costCents?: number | null };

function weekOf(entries: readonly Counted[], frame: WeekFrame, { money }: Shown) {
  const days = weekDays(countedOf(entries), frame.startsOn, frame.timeZone);
  return {
    ...{ days, ...weekTotals(days) },
    hasOpenEntry: entries.some((entry) => entry.endedAt === null),
    ...(money ? { costCents: costOf(entries, frame) } : {}),
  };
}

/** What the part of each entry that lies in the week costs. */
function costOf(entries: readonly Counted[], { timeZone, startsOn, endsOn }: WeekFrame): number {
  return entries
    .flatMap((entry) =>
      countedOf([entry]).flatMap((stretch) =>
        costedParts({ ...stretch, costCents: entry.costCents ?? 0 }, timeZone),
      ),
    )
    .filter((part) => part.on >= startsOn && part.on <= endsOn)
    .reduce((sum, part) => sum + part.costCents, 0);
}

/** Open and voided entries count in no sum. */
function countedOf(
  rows: readonly (Pick<TimeEntry, 'kind' | 'startedAt' | 'endedAt'> & { voidedAt?: Date | null })[],
): Stretch[] {
  return rows.flatMap(({ kind, startedAt, endedAt, voidedAt = null }) =>
    endedAt === null || voidedAt !== null
      ? []
      : [{ kind, startedAt: startedAt.toISOString(), endedAt: endedAt.toISOString() }],
  );
}

function entriesOf(scope: ShopScope, memberId: string, frame: WeekFrame): Promise<StoredEntry[]> {
  const query = pricedEntryQuery(scope).where('entry.memberId = :memberId', { memberId });
  return onlyWeek(query, frame).orderBy('entry.startedAt').orderBy('entry.id').all<StoredEntry>();
}

function countedEntries(scope: ShopScope, frame: WeekFrame, { money }: Shown): Promise<Counted[]> {
  const query = scope
    .query(TimeEntry, 'entry')
    .pick({
      memberId: 'entry.memberId',
      kind: 'entry.kind',
      startedAt: 'entry.startedAt',
      endedAt: 'entry.endedAt',
    })
    .where('entry.voidedAt is null');
  if (money) query.pick({ costCents: 'entry.costCents' });
  return onlyWeek(query, frame).all<Counted>();
}

type NamedMember = Pick<Member, 'id' | 'role' | 'removedAt'> & { name: string };

async function membersOf(scope: ShopScope): Promise<NamedMember[]> {
  const rows = await namedMembers(scope).all<NamedMember>();
  return rows.sort((a, b) => a.name.localeCompare(b.name));
}

async function memberOf(scope: ShopScope, id: string): Promise<NamedMember> {
  const member = await namedMembers(scope).where('member.id = :id', { id }).first<NamedMember>();
  if (!member) throw notFound('This member');
  return member;
}

function namedMembers(scope: ShopScope): ShopQuery {
  return scope.query(Member, 'member').pick({
    id: 'member.id',
    role: 'member.role',
    removedAt: 'member.removedAt',
    name: '(select person.name from person where person.id = member.person_id)',
  });
}
