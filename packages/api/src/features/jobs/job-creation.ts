import type { CreateJob } from '@bookmatch/common/jobs/jobs-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { invalid } from '../../platform/http/problem-error.js';
import { Customer, Site } from '../customers/customers-public.js';
import type { AcceptedEstimate } from '../estimates/estimates-public.js';
import { takeNumber } from '../shops/shops-public.js';
import { JobBillingStage } from './job-billing-stage.entity.js';
import { JobOperation } from './job-operation.entity.js';
import { planByHand, type JobPlan } from './job-plan.js';
import { JobPlannedCost } from './job-planned-cost.entity.js';
import { JobStageChange } from './job-stage-change.entity.js';
import { Job } from './job.entity.js';

type Origin = Pick<
  Job,
  | 'title'
  | 'customerId'
  | 'siteId'
  | 'estimateId'
  | 'estimateNumber'
  | 'revisionNumber'
  | 'installOn'
  | 'openToCrew'
  | 'notes'
>;

/** The end of time: where jobs without an install date stand in lists that are ordered by it. */
export const NO_INSTALL_DATE = '9999-12-31';

/**
 * The job that an acceptance makes, in its transaction. An estimate is accepted once; should two acceptances race, the
 * unique index on the estimate lets one job be.
 */
export function createJobFromAcceptance(
  scope: ShopScope,
  { estimate, revision }: AcceptedEstimate,
): Promise<Job> {
  const origin: Origin = {
    title: estimate.title,
    customerId: estimate.customerId,
    siteId: estimate.siteId,
    estimateId: estimate.id,
    estimateNumber: estimate.number,
    revisionNumber: revision.number,
    installOn: null,
    openToCrew: true,
    notes: '',
  };
  return insertJob(scope, origin, {
    ...revision,
    operations: revision.plannedWork,
    costs: revision.plannedCostByCategory.map(({ kind, costCents }) => ({
      category: kind,
      plannedCents: costCents,
    })),
    stages: revision.billingSchedule,
  });
}

/** A job taken on without an estimate. */
export async function createJobByHand(scope: ShopScope, input: CreateJob): Promise<Job> {
  const { title, customerId, siteId, installOn, openToCrew, notes } = input;
  await requirePlace(scope, customerId, siteId);
  const origin = {
    ...{ title, customerId, siteId, installOn, openToCrew, notes },
    ...{ estimateId: null, estimateNumber: null, revisionNumber: null },
  };
  return insertJob(scope, origin, await planByHand(scope, input));
}

async function requirePlace(scope: ShopScope, customerId: string, siteId: string | null): Promise<void> {
  if (!(await scope.rows(Customer).find(customerId)))
    throw invalid('customerId', 'Choose a customer of this shop.');
  if (siteId !== null && !(await scope.rows(Site).findOneBy({ id: siteId, customerId })))
    throw invalid('siteId', 'Choose a site of this customer.');
}

async function insertJob(scope: ShopScope, origin: Origin, plan: JobPlan): Promise<Job> {
  const number = await takeNumber(scope, 'job');
  const job = await scope.rows(Job).insert({
    ...origin,
    id: scope.newId(),
    number,
    stage: 'accepted',
    stageChangedAt: scope.now,
    installOrder: origin.installOn ?? NO_INSTALL_DATE,
    closedAt: null,
    assignedAt: null,
    plannedMinutes: plan.operations.reduce((sum, row) => sum + row.plannedMinutes, 0),
    contractNetCents: plan.netCents,
    contractTaxCents: plan.taxCents,
    contractTotalCents: plan.totalCents,
    plannedCostCents: plan.costs.reduce((sum, row) => sum + row.plannedCents, 0),
  });
  await insertPlan(scope, job.id, plan);
  return job;
}

async function insertPlan(scope: ShopScope, jobId: string, plan: JobPlan): Promise<void> {
  const mine = () => ({ id: scope.newId(), jobId });
  await scope.rows(JobOperation).insertMany(
    plan.operations.map(({ operationId, plannedMinutes, plannedCostCents }) => ({
      ...mine(),
      ...{ operationId, plannedMinutes, plannedCostCents },
    })),
  );
  await scope
    .rows(JobPlannedCost)
    .insertMany(plan.costs.map(({ category, plannedCents }) => ({ ...mine(), category, plannedCents })));
  await scope.rows(JobBillingStage).insertMany(
    plan.stages.map(({ id, name, share, deposit, due, netCents, taxCents, totalCents }, index) => ({
      // The stage keeps the id that it had in the accepted schedule.
      ...{ id, jobId, position: index + 1, invoiceId: null },
      ...{ name, share, deposit, due, netCents, taxCents, totalCents },
    })),
  );
  const { author } = scope.stamp;
  await scope.rows(JobStageChange).insert({
    ...mine(),
    fromStage: null,
    toStage: 'accepted',
    memberId: author.kind === 'member' ? author.memberId : null,
    reason: '',
  });
}
