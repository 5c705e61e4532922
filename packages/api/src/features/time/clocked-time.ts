import { dateIn, weekStart } from '@bookmatch/common/calendar/shop-dates';
import { splitByDay, weekBounds } from '@bookmatch/common/time/shop-week';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ClockedOperation, ClockedTime } from '../jobs/jobs-public.js';
import { shopOf } from '../shops/shops-public.js';
import { onlyAfter } from './time-lists.js';
import { TimeEntry } from './time-entry.entity.js';

/** What jobs ask of the clock: minutes and cost by operation, and who is on a job now. */
export const clockedTime: ClockedTime = {
  async byOperation(scope, jobId): Promise<ClockedOperation[]> {
    const [sums, thisWeek] = await Promise.all([sumsOf(scope, jobId), minutesThisWeek(scope, jobId)]);
    return sums.map(({ operationId, minutes, costCents }) => ({
      operationId,
      minutes: Number(minutes),
      costCents: Number(costCents),
      thisWeekMinutes: thisWeek.get(operationId) ?? 0,
    }));
  },

  async clockedIn(scope, jobId): Promise<string[]> {
    const rows = await scope
      .query(TimeEntry, 'entry')
      .pick({
        name: '(select person.name from member join person on person.id = member.person_id where member.shop_id = entry.shop_id and member.id = entry.member_id)',
      })
      .where('entry.openMemberId is not null and entry.jobId = :jobId', { jobId })
      .orderBy('entry.startedAt')
      .all<{ name: string }>();
    return rows.map((row) => row.name);
  },

  sums: { minutes: sumSql('minutes'), costCents: sumSql('cost_cents') },
};

/** SQL: a sum over the time of the job beside the alias `job`. */
function sumSql(column: 'minutes' | 'cost_cents'): string {
  return `(select coalesce(sum(clocked.${column}), 0) from time_entry clocked where clocked.shop_id = job.shop_id and clocked.job_id = job.id and clocked.voided_at is null)`;
}

type Sums = { operationId: string; minutes: number | string; costCents: number | string };

function sumsOf(scope: ShopScope, jobId: string): Promise<Sums[]> {
  return scope
    .query(TimeEntry, 'entry')
    .pick({
      operationId: 'entry.operationId',
      minutes: 'coalesce(sum(entry.minutes), 0)',
      costCents: 'cast(coalesce(sum(entry.costCents), 0) as signed)',
    })
    .where('entry.jobId = :jobId and entry.voidedAt is null and entry.minutes is not null', { jobId })
    .groupBy('entry.operationId')
    .all<Sums>();
}

/** Minutes by operation that fall in the current workweek on the wall of the shop. */
async function minutesThisWeek(scope: ShopScope, jobId: string): Promise<Map<string, number>> {
  const { timeZone } = await shopOf(scope);
  const startsOn = weekStart(dateIn(timeZone, scope.now.toISOString()));
  const query = scope
    .query(TimeEntry, 'entry')
    .pick({ operationId: 'entry.operationId', startedAt: 'entry.startedAt', endedAt: 'entry.endedAt' })
    .where('entry.jobId = :jobId and entry.voidedAt is null and entry.endedAt is not null', { jobId });
  onlyAfter(query, new Date(weekBounds(startsOn, timeZone).from));
  const minutes = new Map<string, number>();
  for (const row of await query.all<{ operationId: string; startedAt: Date; endedAt: Date }>()) {
    const parts = splitByDay(row.startedAt.toISOString(), row.endedAt.toISOString(), timeZone);
    const inWeek = parts.filter((part) => part.on >= startsOn).reduce((sum, part) => sum + part.minutes, 0);
    minutes.set(row.operationId, (minutes.get(row.operationId) ?? 0) + inWeek);
  }
  return minutes;
}
