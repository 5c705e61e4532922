import { Decimal } from 'decimal.js';
import { COST_CATEGORIES, type CostCategory } from '../estimates/cost-categories.js';
import { roundHalfUp, sumCents, type Cents } from '../money/cents.js';
import { ratio } from '../money/ratio.js';
import type { JobCostRow } from './jobs-contract.js';

export type PlannedCost = { category: CostCategory; plannedCents: Cents };
/** Spent or clocked; a reversal is below zero. */
export type ActualCost = { category: CostCategory; amountCents: Cents };

/** One row for each category that was planned or has a cost, in the order of COST_CATEGORIES. */
export function costRows(planned: readonly PlannedCost[], actual: readonly ActualCost[]): JobCostRow[] {
  const named = new Set([...planned, ...actual].map((row) => row.category));
  return COST_CATEGORIES.filter((category) => named.has(category)).map((category) => ({
    category,
    plannedCents: sumCents(planned.filter(of(category)).map((row) => row.plannedCents)),
    actualCents: sumCents(actual.filter(of(category)).map((row) => row.amountCents)),
  }));
}

export type Progress = {
  plannedCostCents: Cents;
  actualCostCents: Cents;
  /** What the job is on pace for: what was spent and what is still to go. */
  expectedCostCents: Cents;
  /** A decimal to four places; null when nothing was planned. */
  percentComplete: string | null;
  earnedCents: Cents;
  overBilledCents: Cents;
};
export type ProgressFacts = {
  costs: readonly JobCostRow[];
  /** The agreed price without tax. */
  contractNetCents: Cents;
  /** Invoiced without tax, less credits. */
  billedNetCents: Cents;
  closed: boolean;
};

/**
 * How far a job is, what it has earned, and whether more or less than that was billed.
 *
 * Progress is cost-to-cost, the input method of ASC 606-10-55-20 (IFRS 15.B18): cost so far over expected cost. The
 * expected cost of a category is its plan, or what was spent once that is more; a closed job expects no more than it
 * cost and is complete.
 */
export function jobProgress({ costs, contractNetCents, billedNetCents, closed }: ProgressFacts): Progress {
  const plannedCostCents = sumCents(costs.map((row) => row.plannedCents));
  const actualCostCents = sumCents(costs.map((row) => row.actualCents));
  const expectedCostCents = closed ? actualCostCents : sumCents(costs.map(expectedCost));
  const done = completion({ plannedCostCents, actualCostCents, expectedCostCents, closed });
  const earnedCents = done === null ? 0 : roundHalfUp(done.times(contractNetCents));
  return {
    plannedCostCents,
    actualCostCents,
    expectedCostCents,
    percentComplete: done === null ? null : done.toDecimalPlaces(4, Decimal.ROUND_HALF_UP).toFixed(),
    earnedCents,
    overBilledCents: billedNetCents - earnedCents,
  };
}

/** The plan of a category, or what was spent once that is more. */
export function expectedCost(row: JobCostRow): Cents {
  return Math.max(row.plannedCents, row.actualCents);
}

type Costs = Pick<Progress, 'plannedCostCents' | 'actualCostCents' | 'expectedCostCents'>;

/** Exact, from 0 to 1. Costs reversed below zero in one category do not take a job below its start. */
function completion({
  plannedCostCents,
  actualCostCents,
  expectedCostCents,
  closed,
}: Costs & { closed: boolean }): Decimal | null {
  if (closed) return new Decimal(1);
  if (plannedCostCents <= 0) return null;
  return Decimal.min(1, Decimal.max(0, new Decimal(actualCostCents).div(expectedCostCents)));
}

/** The share of planned time that was used, `"1.25"` for a quarter over; null when none was planned. */
export function hoursUsed(plannedMinutes: number, clockedMinutes: number): string | null {
  return ratio(clockedMinutes, plannedMinutes);
}

function of(category: CostCategory) {
  return (row: { category: CostCategory }) => row.category === category;
}
