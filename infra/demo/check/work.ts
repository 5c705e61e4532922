import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import { Job, JobBillingStage, JobOperation } from '@bookmatch/api/features/jobs/jobs-public';
import { JobPlannedCost } from '@bookmatch/api/features/jobs/job-planned-cost.entity';
import { TimeEntry } from '@bookmatch/api/features/time/time-public';
import { laborCost } from '@bookmatch/common/time/labor-cost';
import { elapsedMinutes } from '@bookmatch/common/time/punch';
import { sumCents } from '@bookmatch/common/money/cents';
import type { Services } from '../making/desk.js';
import { none, type Finding } from './finding.js';

/** Jobs and time against what they were made from. */
export async function checkWork(scope: ShopScope, services: Services, now: Date): Promise<Finding[]> {
  const jobs = await scope.rows(Job).findBy({}, 'number');
  const entries = await scope.rows(TimeEntry).findBy({ voidedAt: null }, 'startedAt');
  return [
    none('nobody worked twice at the same time', overlaps(entries)),
    none('nothing was clocked ahead of time', ahead(entries, now)),
    none('every entry counts its own minutes and cost', wrongMinutes(entries)),
    none('every job is what it was agreed to be', await wrongAgreements(scope, jobs)),
    none('every job page shows the time of its entries', await wrongPages(scope, services, jobs, entries)),
  ];
}

function overlaps(entries: readonly TimeEntry[]): string[] {
  const lastOf = new Map<string, TimeEntry>();
  return entries.flatMap((entry) => {
    const before = lastOf.get(entry.memberId);
    lastOf.set(entry.memberId, entry);
    const overlapping = before && (before.endedAt === null || before.endedAt > entry.startedAt);
    return overlapping ? [`${entry.memberId} at ${entry.startedAt.toISOString()}`] : [];
  });
}

function ahead(entries: readonly TimeEntry[], now: Date): string[] {
  return entries
    .filter(({ startedAt, endedAt }) => startedAt > now || (endedAt ?? now) > now)
    .map(({ id, startedAt }) => `${id} at ${startedAt.toISOString()}`);
}

function wrongMinutes(entries: readonly TimeEntry[]): string[] {
  return entries.filter((entry) => !isMeasured(entry)).map(({ id }) => id);
}

function isMeasured({
  kind,
  startedAt,
  endedAt,
  minutes,
  costCents,
  laborCostCentsPerHour,
}: TimeEntry): boolean {
  if (endedAt === null) return minutes === null && costCents === null;
  const elapsed = elapsedMinutes(startedAt.toISOString(), endedAt.toISOString());
  const cost =
    kind === 'work' && laborCostCentsPerHour !== null ? laborCost(elapsed, laborCostCentsPerHour) : 0;
  return minutes === elapsed && (costCents ?? 0) === cost;
}

/** Stages bill the contract, the plan by operation and by category is that of the job. */
async function wrongAgreements(scope: ShopScope, jobs: readonly Job[]): Promise<string[]> {
  const stages = await scope.rows(JobBillingStage).findBy({}, 'position');
  const operations = await scope.rows(JobOperation).findBy({});
  const costs = await scope.rows(JobPlannedCost).findBy({});
  const of = <Row extends { jobId: string }>(rows: readonly Row[], { id }: Job) =>
    rows.filter((row) => row.jobId === id);
  return jobs
    .filter((job) => {
      const billed = sumCents(of(stages, job).map(({ totalCents }) => totalCents));
      const minutes = of(operations, job).reduce((sum, { plannedMinutes }) => sum + plannedMinutes, 0);
      const planned = sumCents(of(costs, job).map(({ plannedCents }) => plannedCents));
      return (
        billed !== job.contractTotalCents ||
        minutes !== job.plannedMinutes ||
        planned !== job.plannedCostCents
      );
    })
    .map(({ number }) => `job ${number}`);
}

async function wrongPages(
  scope: ShopScope,
  { jobs: service }: Services,
  jobs: readonly Job[],
  entries: readonly TimeEntry[],
): Promise<string[]> {
  const wrong: string[] = [];
  for (const { id, number } of jobs) {
    const clocked = entries
      .filter(({ jobId }) => jobId === id)
      .reduce((sum, { minutes }) => sum + (minutes ?? 0), 0);
    const page = await service.get(scope, id);
    const billed = page.money?.billing.reduce((sum, row) => sum + row.plannedCents, 0);
    if (page.clockedMinutes !== clocked || billed !== page.money?.contractTotalCents)
      wrong.push(`job ${number}`);
  }
  return wrong;
}
