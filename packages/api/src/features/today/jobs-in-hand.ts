import { JOB_STAGES, type JobStage } from '@bookmatch/common/jobs/jobs-contract';
import type { JobInHand } from '@bookmatch/common/today/today-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import { Customer } from '../customers/customers-public.js';
import { Job, onlyReadable } from '../jobs/jobs-public.js';
import { clockedTime } from '../time/time-public.js';

const STAGES_IN_HAND = JOB_STAGES.filter((stage) => stage !== 'closed');
const IN_HAND = `job.stage in (${STAGES_IN_HAND.map((stage) => `'${stage}'`).join(', ')})`;

type Stored = Omit<JobInHand, 'clockedMinutes'> & { clockedMinutes: number | string; inAll: number | string };

/** Jobs that are not closed, the soonest install first, and how many there are in all. No money. */
export async function jobsInHand(
  scope: ShopScope,
  limit: number,
): Promise<{ count: number; rows: JobInHand[] }> {
  const rows = await soonestFirst(scope).limit(limit).all<Stored>();
  return { count: Number(rows[0]?.inAll ?? 0), rows: rows.map(viewRow) };
}

/** The jobs in hand that are to be installed from one date to another, both included. */
export async function installsBetween(
  scope: ShopScope,
  { from, to, limit }: { from: string; to: string; limit: number },
): Promise<JobInHand[]> {
  const rows = await soonestFirst(scope)
    .where('job.installOrder >= :from and job.installOrder <= :to', { from, to })
    .limit(limit)
    .all<Stored>();
  return rows.map(viewRow);
}

/** How many jobs stand at each stage but the last, in the order of the stages. */
export async function jobsByStage(scope: ShopScope): Promise<{ stage: JobStage; count: number }[]> {
  const query = scope.query(Job, 'job').pick({ stage: 'job.stage', count: 'count(*)' }).where(IN_HAND);
  const counts = await onlyReadable(scope, query)
    .groupBy('job.stage')
    .all<{ stage: string; count: number | string }>();
  return STAGES_IN_HAND.map((stage) => ({
    stage,
    count: Number(counts.find((row) => row.stage === stage)?.count ?? 0),
  }));
}

function soonestFirst(scope: ShopScope): ShopQuery {
  const query = scope
    .query(Job, 'job')
    .join(Customer, 'customer', 'customer.id = job.customerId')
    .pick({
      id: 'job.id',
      number: 'job.number',
      title: 'job.title',
      customerName: 'customer.name',
      stage: 'job.stage',
      installOn: 'job.installOn',
      plannedMinutes: 'job.plannedMinutes',
      clockedMinutes: clockedTime.sums.minutes,
      inAll: 'count(*) over ()',
    })
    .where(IN_HAND);
  return onlyReadable(scope, query).orderBy('job.installOrder').orderBy('job.id');
}

function viewRow({ clockedMinutes, inAll: _inAll, ...row }: Stored): JobInHand {
  return { ...row, clockedMinutes: Number(clockedMinutes) };
}
