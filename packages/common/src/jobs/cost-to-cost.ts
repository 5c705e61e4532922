import { Decimal } from 'decimal.js';
import { roundHalfUp, sumCents, type Cents } from '../money/cents.js';
import { ratio } from '../money/ratio.js';
import type { JobCostRow } from './jobs-contract.js';

export type CostProgress = {
  plannedCostCents: Cents;
  actualCostCents: Cents;
  /** Spent and still to go: what the job is on pace for. */
  expectedCostCents: Cents;
  /** As a decimal to four places; null when nothing was planned and nothing spent. */
  percentComplete: string | null;
};

/**
 * Progress by cost-to-cost: cost to date ÷ (cost to date + cost to go).
 *
 * Cost to go is taken category by category, what is planned and not yet spent, so that running over on material does
 * not make the install look done. A closed job has nothing to go.
 */
export function costProgress(costs: readonly JobCostRow[], closed: boolean): CostProgress {
  const plannedCostCents = sumCents(costs.map((row) => row.plannedCents));
  const actualCostCents = sumCents(costs.map((row) => row.actualCents));
  const toGo = closed ? 0 : sumCents(costs.map((row) => Math.max(0, row.plannedCents - row.actualCents)));
  const expectedCostCents = actualCostCents + toGo;
  return {
    plannedCostCents,
    actualCostCents,
    expectedCostCents,
    percentComplete: ratio(actualCostCents, expectedCostCents),
  };
}

/** What the work done has earned of the net contract, half-up to the cent. */
export function earned(contractNetCents: Cents, { actualCostCents, expectedCostCents }: CostProgress): Cents {
  if (expectedCostCents <= 0) return 0;
  return roundHalfUp(new Decimal(contractNetCents).times(actualCostCents).div(expectedCostCents));
}

/** Net billed less earned: above zero the job is over-billed, below zero under-billed. */
export function overBilled(billedNetCents: Cents, earnedCents: Cents): Cents {
  return billedNetCents - earnedCents;
}
