import { addDays, dateIn, startOfDay } from '@bookmatch/common/calendar/shop-dates';
import type { ClockState } from '@bookmatch/common/time/clock-contract';
import { MAX_ENTRY_MINUTES } from '@bookmatch/common/time/clock-rules';
import { splitByDay } from '@bookmatch/common/time/shop-week';
import type { ShopScope } from '../../platform/database/scope.js';
import { shopOf } from '../shops/shops-public.js';
import { clockChoices } from './clock-choices.js';
import { entryQuery, viewEntry, type StoredEntry } from './entry-rows.js';
import { TimeEntry } from './time-entry.entity.js';

/** What the clock of the one who asks shows. */
export async function clockStateOf(scope: ShopScope): Promise<ClockState> {
  const { timeZone } = await shopOf(scope);
  const [open, todayMinutes, choices] = await Promise.all([
    openEntry(scope),
    workOfToday(scope, timeZone),
    clockChoices(scope),
  ]);
  return { open, todayMinutes, choices };
}

async function openEntry(scope: ShopScope): Promise<ClockState['open']> {
  const row = await entryQuery(scope)
    .where('entry.openMemberId = :memberId', { memberId: scope.memberId })
    .first<StoredEntry>();
  return row && viewEntry(row);
}

/** Work in closed entries that falls in the day on the wall of the shop, also of a shift that ran in from the day before. */
async function workOfToday(scope: ShopScope, zone: string): Promise<number> {
  const today = dateIn(zone, scope.now.toISOString());
  const from = new Date(startOfDay(zone, today));
  const to = new Date(startOfDay(zone, addDays(today, 1)));
  const since = new Date(from.getTime() - MAX_ENTRY_MINUTES * 60_000);
  const rows = await scope
    .query(TimeEntry, 'entry')
    .pick({ startedAt: 'entry.startedAt', endedAt: 'entry.endedAt' })
    .where('entry.memberId = :memberId and entry.voidedAt is null', { memberId: scope.memberId })
    .where("entry.startedAt >= :since and entry.startedAt < :to and entry.kind = 'work'", { since, to })
    .where('entry.endedAt > :from', { from })
    .all<{ startedAt: Date; endedAt: Date }>();
  return rows
    .flatMap((row) => splitByDay(row.startedAt.toISOString(), row.endedAt.toISOString(), zone))
    .filter((part) => part.on === today)
    .reduce((sum, part) => sum + part.minutes, 0);
}
