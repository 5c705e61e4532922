import type { ClockJobs } from '@bookmatch/common/time/clock-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Job, JobOperation, onlyReadable } from '../jobs/jobs-public.js';
import { Operation } from '../shops/shops-public.js';
import { clockedMinutes } from './minutes-left.js';

const MOST_JOBS = 200;

/** Every open job that the member may clock in to, the newest first, and the operations in use. */
export async function clockJobs(scope: ShopScope): Promise<ClockJobs> {
  const [jobs, planned, operations] = await Promise.all([
    openJobs(scope),
    plannedWork(scope),
    operationsInUse(scope),
  ]);
  return {
    jobs: jobs.map((job) => ({ ...job, planned: planned.get(job.jobId) ?? [] })),
    operations,
  };
}

function openJobs(scope: ShopScope) {
  const query = scope
    .query(Job, 'job')
    .pick({ jobId: 'job.id', jobNumber: 'job.number', jobTitle: 'job.title' })
    .where('job.closedAt is null')
    .orderBy('job.number', 'DESC')
    .limit(MOST_JOBS);
  return onlyReadable(scope, query).all<{ jobId: string; jobNumber: number; jobTitle: string }>();
}

type Planned = ClockJobs['jobs'][number]['planned'];

async function plannedWork(scope: ShopScope): Promise<Map<string, Planned>> {
  const query = scope
    .query(JobOperation, 'planned')
    .join(Job, 'job', 'job.id = planned.jobId')
    .join(Operation, 'operation', 'operation.id = planned.operationId')
    .pick({
      jobId: 'planned.jobId',
      operationId: 'planned.operationId',
      plannedMinutes: 'planned.plannedMinutes',
      clockedMinutes: clockedMinutes('planned.job_id', 'planned.operation_id', 'planned.shop_id'),
    })
    .where('job.closedAt is null and operation.archivedAt is null')
    .orderBy('operation.position');
  const byJob = new Map<string, Planned>();
  for (const row of await onlyReadable(scope, query).all<StoredPlan>()) {
    const minutesLeft = row.plannedMinutes - Number(row.clockedMinutes);
    byJob.set(row.jobId, [...(byJob.get(row.jobId) ?? []), { operationId: row.operationId, minutesLeft }]);
  }
  return byJob;
}
type StoredPlan = {
  jobId: string;
  operationId: string;
  plannedMinutes: number;
  clockedMinutes: number | string;
};

function operationsInUse(scope: ShopScope): Promise<ClockJobs['operations']> {
  return scope
    .query(Operation, 'operation')
    .pick({ operationId: 'operation.id', operationName: 'operation.name', onJob: 'operation.onJob' })
    .where('operation.archivedAt is null')
    .orderBy('operation.position')
    .all();
}
