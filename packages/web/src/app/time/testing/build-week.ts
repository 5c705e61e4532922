import type { MemberWeek, ShopWeek, WeekDay } from '@bookmatch/common/time/week-contract';
import { weekDays, weekTotals } from '@bookmatch/common/time/shop-week';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';

const STARTS_ON = '2027-01-11';
const ZONE = 'America/New_York';
export const MEMBER_ID = '01940000-0000-7000-8000-0000000000d1';

/** A week in New York of the entries given; its sums follow from them. */
export function buildMemberWeek(
  entries: TimeEntryRow[] = [],
  overrides: Partial<MemberWeek> = {},
): MemberWeek {
  const days = daysOf(entries);
  return {
    ...{ memberId: MEMBER_ID, memberName: 'Ines Okafor', days, ...weekTotals(days), entries },
    ...{ startsOn: STARTS_ON, endsOn: '2027-01-17', timeZone: ZONE },
    ...overrides,
  };
}

type Row = ShopWeek['members'][number];

export function buildShopWeekRow(overrides: Partial<Row> = {}): Row {
  const days = daysOf([]).map((day, index) => ({ ...day, workMinutes: index < 2 ? 480 : 0 }));
  return {
    ...{ memberId: MEMBER_ID, memberName: 'Ines Okafor', role: 'crew', days, ...weekTotals(days) },
    hasOpenEntry: false,
    ...overrides,
  };
}

export function buildShopWeek(members: Row[] = [buildShopWeekRow()]): ShopWeek {
  const workMinutes = members.reduce((sum, row) => sum + row.workMinutes, 0);
  return { startsOn: STARTS_ON, endsOn: '2027-01-17', timeZone: ZONE, members, workMinutes };
}

function daysOf(entries: readonly TimeEntryRow[]): WeekDay[] {
  const counted = entries.flatMap(({ kind, startedAt, endedAt, voidedAt }) =>
    endedAt === null || voidedAt !== null ? [] : [{ kind, startedAt, endedAt }],
  );
  return weekDays(counted, STARTS_ON, ZONE);
}
