import { COST_CATEGORY_NAMES } from '../estimates/cost-categories.js';
import type { JobBillingRow, JobCostRow, JobOperation } from './jobs-contract.js';

/**
 * One row of the mirrored pair: what was planned on the left, what was built on the right. The unit is that of the list
 * it stands in: cents for costs and billing, minutes for hours.
 */
export type MirroredRow = {
  key: string;
  name: string;
  planned: number;
  built: number;
  /** Built less planned: above zero is over. */
  difference: number;
  /** How much of built lies above planned; 0 while it does not. */
  over: number;
};

export function mirror(key: string, name: string, planned: number, built: number): MirroredRow {
  const difference = built - planned;
  return { key, name, planned, built, difference, over: Math.max(0, difference) };
}

/** The row under the others. Its over is that of the sums: a saving in one row makes up for an excess in another. */
export function mirrorTotal(rows: readonly MirroredRow[], name = 'Total'): MirroredRow {
  const planned = rows.reduce((total, row) => total + row.planned, 0);
  const built = rows.reduce((total, row) => total + row.built, 0);
  return mirror('total', name, planned, built);
}

/** Cost by category, in cents. */
export function mirrorCosts(costs: readonly JobCostRow[]): MirroredRow[] {
  return costs.map((row) =>
    mirror(row.category, COST_CATEGORY_NAMES[row.category], row.plannedCents, row.actualCents),
  );
}

type Hours = Pick<JobOperation, 'operationId' | 'name' | 'plannedMinutes' | 'clockedMinutes'>;
type Billing = Pick<JobBillingRow, 'billingStageId' | 'name' | 'plannedCents' | 'billedCents'>;

/** Hours by operation, in minutes. */
export function mirrorHours(operations: readonly Hours[]): MirroredRow[] {
  return operations.map((row) => mirror(row.operationId, row.name, row.plannedMinutes, row.clockedMinutes));
}

/** Billing by stage, in cents with tax. */
export function mirrorBilling(billing: readonly Billing[]): MirroredRow[] {
  return billing.map((row) => mirror(row.billingStageId, row.name, row.plannedCents, row.billedCents));
}
