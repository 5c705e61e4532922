import { costProgress, earned, overBilled } from '../jobs/cost-to-cost.js';
import type { Job, JobMoney, JobOperation } from '../jobs/jobs-contract.js';
import { MADE_AT, nextId, nextNumber } from './ids.js';

export function buildJobOperation(overrides: Partial<JobOperation> = {}): JobOperation {
  return {
    operationId: nextId(),
    name: 'Face frames',
    category: 'labor',
    plannedMinutes: 540,
    clockedMinutes: 258,
    thisWeekMinutes: 0,
    ...overrides,
  };
}

/** A job as the floor sees it; pass `money: buildJobMoney()` for one who may see money. */
export function buildJob(overrides: Partial<Job> = {}): Job {
  const operations = overrides.operations ?? [buildJobOperation()];
  return {
    id: nextId(),
    version: 1,
    number: nextNumber('job', 1001),
    title: 'Mudroom lockers and bench',
    customer: { id: nextId(), name: 'Wren Halloway' },
    site: null,
    estimate: { id: nextId(), number: 101, revisionNumber: 1 },
    stage: 'building',
    stageChangedAt: MADE_AT,
    stageHistory: [{ stage: 'accepted', at: MADE_AT, by: null, reason: '' }],
    installOn: '2027-02-18',
    openToCrew: true,
    assignedMembers: [],
    notes: '',
    operations,
    plannedMinutes: operations.reduce((sum, row) => sum + row.plannedMinutes, 0),
    clockedMinutes: operations.reduce((sum, row) => sum + row.clockedMinutes, 0),
    closedAt: null,
    createdAt: MADE_AT,
    ...overrides,
  };
}

/** Whatever costs and contract are given, the figures that follow from them are those of the rules. */
export function buildJobMoney(overrides: Partial<JobMoney> = {}): JobMoney {
  const costs = overrides.costs ?? [{ category: 'material', plannedCents: 640_000, actualCents: 320_000 }];
  const { contractNetCents = 1_000_000, contractTaxCents = 82_500, billedNetCents = 400_000 } = overrides;
  const progress = costProgress(costs, false);
  const earnedCents = earned(contractNetCents, progress);
  return {
    contractNetCents,
    contractTaxCents,
    contractTotalCents: contractNetCents + contractTaxCents,
    ...progress,
    costs,
    billing: [],
    billedCents: 433_000,
    billedNetCents,
    paidCents: 0,
    earnedCents,
    overBilledCents: overBilled(billedNetCents, earnedCents),
    ...overrides,
  };
}
