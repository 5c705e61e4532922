import { COST_CATEGORIES, type CostCategory } from '../estimates/cost-categories.js';
import { sumCents, type Cents } from '../money/cents.js';
import { costProgress, earned, overBilled, type CostProgress } from './cost-to-cost.js';
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

export type JobProgress = CostProgress & { earnedCents: Cents; overBilledCents: Cents };
export type ProgressFacts = {
  costs: readonly JobCostRow[];
  /** The agreed price without tax. */
  contractNetCents: Cents;
  /** Invoiced without tax, less credits. */
  billedNetCents: Cents;
  closed: boolean;
};

/**
 * How far a job is, what it has earned, and whether more or less than that was billed: cost-to-cost, the input method
 * of ASC 606-10-55-20 (IFRS 15.B18). A closed job is complete and has earned its contract, whatever it cost. Without
 * planned cost nothing says how far an open job is: it has earned nothing yet.
 */
export function jobProgress({ costs, contractNetCents, billedNetCents, closed }: ProgressFacts): JobProgress {
  const progress = costProgress(costs, closed);
  const known = closed || progress.plannedCostCents > 0;
  const earnedCents = closed ? contractNetCents : known ? earned(contractNetCents, progress) : 0;
  return {
    ...progress,
    percentComplete: closed ? '1' : known ? progress.percentComplete : null,
    earnedCents,
    overBilledCents: overBilled(billedNetCents, earnedCents),
  };
}

function of(category: CostCategory) {
  return (row: { category: CostCategory }) => row.category === category;
}
