import type { JobOperation as JobOperationView } from '@bookmatch/common/jobs/jobs-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Operation } from '../shops/shops-public.js';
import type { ClockedOperation } from './clocked-time.js';
import { seesMoney } from './job-access.js';
import { JobOperation } from './job-operation.entity.js';

/** A job's operations in the shop's order, planned beside clocked: those that were planned, and those only clocked to. */
export async function viewOperations(
  scope: ShopScope,
  job: { id: string },
  clocked: readonly ClockedOperation[],
): Promise<JobOperationView[]> {
  const planned = await scope.rows(JobOperation).findBy({ jobId: job.id });
  const ids = new Set([...planned, ...clocked].map((row) => row.operationId));
  const operations = await scope.rows(Operation).findBy({ id: [...ids] }, 'position');
  const plans = new Map(planned.map((row) => [row.operationId, row]));
  const built = new Map(clocked.map((row) => [row.operationId, row]));
  const money = seesMoney(scope);
  return operations.map(({ id, name, costCategory }) => {
    const plan = plans.get(id);
    const time = built.get(id);
    return {
      operationId: id,
      name,
      category: costCategory,
      plannedMinutes: plan?.plannedMinutes ?? 0,
      clockedMinutes: time?.minutes ?? 0,
      thisWeekMinutes: time?.thisWeekMinutes ?? 0,
      ...(money
        ? { plannedCostCents: plan?.plannedCostCents ?? 0, actualCostCents: time?.costCents ?? 0 }
        : {}),
    };
  });
}
