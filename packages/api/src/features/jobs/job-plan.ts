import type { BilledStage, BillingStagePlan } from '@bookmatch/common/estimates/billing-schedule-contract';
import { billSchedule } from '@bookmatch/common/estimates/billing-schedule';
import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { CreateJob } from '@bookmatch/common/jobs/jobs-contract';
import { costRows } from '@bookmatch/common/jobs/planned-and-built';
import { laborCost } from '@bookmatch/common/time/labor-cost';
import type { ShopScope } from '../../platform/database/scope.js';
import { invalid, refuse } from '../../platform/http/problem-error.js';
import { refuseSchedule } from '@bookmatch/common/estimates/billing-schedule';
import { Operation, shopOf } from '../shops/shops-public.js';

export type PlannedOperation = { operationId: string; plannedMinutes: number; plannedCostCents: number };
export type PlannedCategoryCost = { category: CostCategory; plannedCents: number };

/** What a job sets out with: agreed with the customer, or given by hand. */
export type JobPlan = {
  netCents: number;
  taxCents: number;
  totalCents: number;
  operations: PlannedOperation[];
  costs: PlannedCategoryCost[];
  stages: BilledStage[];
};

/** The plan of a job made by hand: its time is planned to cost the operations' own rates. */
export async function planByHand(scope: ShopScope, input: CreateJob): Promise<JobPlan> {
  const time = await planTime(scope, input.operations);
  const costs = costRows([...input.plannedCosts, ...time], []);
  const netCents = input.contractNetCents;
  const price = { netCents, taxCents: input.contractTaxCents, totalCents: netCents + input.contractTaxCents };
  return {
    ...price,
    operations: time,
    costs: costs.filter((row) => row.plannedCents > 0),
    stages: await planBilling(scope, price, input.billingSchedule),
  };
}

async function planTime(scope: ShopScope, wanted: CreateJob['operations']) {
  const rows = await scope.rows(Operation).findBy({ id: wanted.map((row) => row.operationId) });
  const known = new Map(rows.filter((row) => row.onJob).map((row) => [row.id, row]));
  return wanted.map(({ operationId, plannedMinutes }, index) => {
    const operation = known.get(operationId);
    if (!operation) throw invalid(`operations.${index}.operationId`, 'Choose an operation of this shop.');
    const plannedCents = laborCost(plannedMinutes, operation.defaultRateCentsPerHour ?? 0);
    return {
      operationId,
      plannedMinutes,
      plannedCostCents: plannedCents,
      category: operation.costCategory,
      plannedCents,
    };
  });
}

/** Work without a price has nothing to bill. */
async function planBilling(
  scope: ShopScope,
  price: { netCents: number; taxCents: number; totalCents: number },
  wanted: CreateJob['billingSchedule'],
): Promise<BilledStage[]> {
  if (price.totalCents === 0) return [];
  const plan = wanted ?? ((await shopOf(scope)).defaultBillingSchedule as BillingStagePlan[]);
  refuse(refuseSchedule(plan, price.totalCents));
  return billSchedule(
    plan.map((stage) => ({ ...stage, id: scope.newId() })),
    price,
  );
}
