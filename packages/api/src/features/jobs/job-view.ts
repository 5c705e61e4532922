import type { Job as JobView, StageChange } from '@bookmatch/common/jobs/jobs-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer, Site } from '../customers/customers-public.js';
import { memberNames } from '../shops/shops-public.js';
import type { ClockedTime } from './clocked-time.js';
import type { AccessedJob } from './job-access.js';
import { seesMoney } from './job-access.js';
import type { JobBilling } from './job-billing.js';
import { viewMoney } from './job-money.js';
import { viewOperations } from './job-operations.js';
import { JobStageChange } from './job-stage-change.entity.js';

export type JobReaders = { time: ClockedTime; billing: JobBilling };

/** The job's page: everything the actor may see of a job, planned beside built. */
export async function viewJob(scope: ShopScope, job: AccessedJob, readers: JobReaders): Promise<JobView> {
  const clocked = await readers.time.byOperation(scope, job.id);
  const [customer, site, operations, names, money] = await Promise.all([
    scope.rows(Customer).get(job.customerId),
    job.siteId === null ? null : scope.rows(Site).get(job.siteId),
    viewOperations(scope, job, clocked),
    memberNames(scope),
    seesMoney(scope) ? viewMoney(scope, job, clocked, readers.billing) : undefined,
  ]);
  const { id, version, number, title, stage, installOn, openToCrew, notes, plannedMinutes } = job;
  return {
    ...{ id, version, number, title, stage, installOn, openToCrew, notes, plannedMinutes, operations },
    customer: { id: customer.id, name: customer.name },
    site: site && { id: site.id, name: site.name, address: site.address, notes: site.notes },
    estimate: estimateOf(job),
    stageChangedAt: job.stageChangedAt.toISOString(),
    stageHistory: await stageHistory(scope, job.id, names),
    assignedMembers: job.assignedMemberIds.map((memberId) => ({
      memberId,
      name: names.get(memberId) ?? '',
    })),
    clockedMinutes: clocked.reduce((sum, row) => sum + row.minutes, 0),
    closedAt: job.closedAt?.toISOString() ?? null,
    createdAt: job.createdAt.toISOString(),
    ...(money ? { money } : {}),
  };
}

function estimateOf({ estimateId, estimateNumber, revisionNumber }: AccessedJob): JobView['estimate'] {
  if (estimateId === null || estimateNumber === null || revisionNumber === null) return null;
  return { id: estimateId, number: estimateNumber, revisionNumber };
}

async function stageHistory(
  scope: ShopScope,
  jobId: string,
  names: Map<string, string>,
): Promise<StageChange[]> {
  const changes = await scope.rows(JobStageChange).findBy({ jobId }, 'createdAt');
  return changes.map(({ toStage, createdAt, memberId, reason }) => ({
    stage: toStage,
    at: createdAt.toISOString(),
    by: memberId === null ? null : (names.get(memberId) ?? ''),
    reason,
  }));
}
