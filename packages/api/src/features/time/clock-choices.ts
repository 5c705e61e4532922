import type { ClockChoice } from '@bookmatch/common/time/clock-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Job, JobAssignment, JobOperation, onlyReadable } from '../jobs/jobs-public.js';
import { Operation } from '../shops/shops-public.js';
import { clockedMinutes } from './minutes-left.js';
import { TimeEntry } from './time-entry.entity.js';

const RECENT_DAYS = 14;
const MOST_RECENT = 8;
const MOST_ASSIGNED = 40;
const DAY_MS = 86_400_000;

type StoredChoice = {
  jobId: string;
  jobNumber: number;
  jobTitle: string;
  operationId: string;
  operationName: string;
  plannedMinutes: number | null;
  clockedMinutes: number | string;
};

/** What the member is likely to work on: what they did last, what they are assigned to, and what belongs to no job. */
export async function clockChoices(scope: ShopScope): Promise<ClockChoice[]> {
  const [recent, assigned, offJob] = await Promise.all([
    recentWork(scope),
    assignedWork(scope),
    offJobWork(scope),
  ]);
  const known = new Set(recent.map(keyOf));
  return [
    ...recent.map((row) => choice(row, true)),
    ...assigned.filter((row) => !known.has(keyOf(row))).map((row) => choice(row, false)),
    ...offJob,
  ];
}

async function recentWork(scope: ShopScope): Promise<StoredChoice[]> {
  const query = scope
    .query(TimeEntry, 'entry')
    .join(Job, 'job', 'job.id = entry.jobId')
    .join(Operation, 'operation', 'operation.id = entry.operationId')
    .leftJoin(JobOperation, 'planned', 'planned.jobId = job.id and planned.operationId = operation.id')
    .pick({
      jobId: 'job.id',
      jobNumber: 'job.number',
      jobTitle: 'job.title',
      operationId: 'operation.id',
      operationName: 'operation.name',
      plannedMinutes: 'planned.plannedMinutes',
      clockedMinutes: clockedMinutes('job.id', 'operation.id', 'job.shop_id'),
      lastAt: 'max(entry.startedAt)',
    })
    .where('entry.memberId = :memberId and entry.voidedAt is null', { memberId: scope.memberId })
    .where('entry.startedAt >= :since', { since: new Date(scope.now.getTime() - RECENT_DAYS * DAY_MS) })
    .where('job.closedAt is null and operation.archivedAt is null')
    .groupBy('job.id')
    .groupBy('operation.id');
  const rows = await onlyReadable(scope, query).all<StoredChoice & { lastAt: Date }>();
  return rows.sort((a, b) => b.lastAt.getTime() - a.lastAt.getTime()).slice(0, MOST_RECENT);
}

function assignedWork(scope: ShopScope): Promise<StoredChoice[]> {
  const query = scope
    .query(JobAssignment, 'assigned')
    .join(Job, 'job', 'job.id = assigned.jobId')
    .join(JobOperation, 'planned', 'planned.jobId = job.id')
    .join(Operation, 'operation', 'operation.id = planned.operationId')
    .pick({
      jobId: 'job.id',
      jobNumber: 'job.number',
      jobTitle: 'job.title',
      operationId: 'operation.id',
      operationName: 'operation.name',
      plannedMinutes: 'planned.plannedMinutes',
      clockedMinutes: clockedMinutes('job.id', 'operation.id', 'job.shop_id'),
    })
    .where('assigned.memberId = :memberId', { memberId: scope.memberId })
    .where('job.closedAt is null and operation.archivedAt is null')
    .orderBy('job.installOrder')
    .orderBy('job.number')
    .orderBy('operation.position')
    .limit(MOST_ASSIGNED);
  return onlyReadable(scope, query).all<StoredChoice>();
}

async function offJobWork(scope: ShopScope): Promise<ClockChoice[]> {
  const rows = await scope
    .query(Operation, 'operation')
    .pick({ operationId: 'operation.id', operationName: 'operation.name' })
    .where('operation.onJob = 0 and operation.archivedAt is null')
    .orderBy('operation.position')
    .all<{ operationId: string; operationName: string }>();
  return rows.map((row) => ({
    ...{ jobId: null, jobNumber: null, jobTitle: null, minutesLeft: null, recent: false },
    ...row,
  }));
}

const keyOf = ({ jobId, operationId }: StoredChoice): string => `${jobId} ${operationId}`;

function choice(row: StoredChoice, recent: boolean): ClockChoice {
  const { jobId, jobNumber, jobTitle, operationId, operationName, plannedMinutes } = row;
  const minutesLeft = plannedMinutes === null ? null : plannedMinutes - Number(row.clockedMinutes);
  return { jobId, jobNumber, jobTitle, operationId, operationName, minutesLeft, recent };
}
