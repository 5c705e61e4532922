import fc from 'fast-check';
import type { CostCategory } from '../estimates/cost-categories.js';
import { costProgress, earned, overBilled } from './cost-to-cost.js';

const cost = (category: CostCategory, plannedCents: number, actualCents: number) => ({
  category,
  plannedCents,
  actualCents,
});

describe('cost-to-cost', () => {
  // A published problem of percentage of completion: price 15,000,000; cost to date 7,200,000; 4,800,000 to go:
  // 60 %, revenue 9,000,000, profit 1,800,000.
  it('earns the share of the contract that its cost has been spent of', () => {
    const progress = costProgress([cost('other', 1_200_000_000, 720_000_000)], false);
    expect(progress).toMatchObject({ expectedCostCents: 1_200_000_000, percentComplete: '0.6' });
    const revenue = earned(1_500_000_000, progress);
    expect(revenue).toBe(900_000_000);
    expect(revenue - progress.actualCostCents).toBe(180_000_000);
    expect(overBilled(1_000_000_000, revenue)).toBe(100_000_000);
    expect(overBilled(800_000_000, revenue)).toBe(-100_000_000);
  });

  it('does not count an excess in one category as progress in another', () => {
    const progress = costProgress([cost('material', 10_000, 15_000), cost('install', 5_000, 0)], false);
    expect(progress).toMatchObject({
      plannedCostCents: 15_000,
      expectedCostCents: 20_000,
      percentComplete: '0.75',
    });
  });

  it('is complete when the job is closed, under its plan too', () => {
    expect(costProgress([cost('material', 10_000, 8_000)], true)).toMatchObject({
      expectedCostCents: 8_000,
      percentComplete: '1',
    });
  });

  it('says nothing of a job without costs', () => {
    const progress = costProgress([], false);
    expect(progress.percentComplete).toBeNull();
    expect(earned(100_000, progress)).toBe(0);
  });

  it('never earns more than the contract', () => {
    const costs = fc.array(
      fc
        .tuple(fc.nat(1_000_000), fc.nat(1_000_000))
        .map(([planned, actual]) => cost('other', planned, actual)),
    );
    fc.assert(
      fc.property(costs, fc.nat(100_000_000), fc.boolean(), (all, contract, closed) => {
        const revenue = earned(contract, costProgress(all, closed));
        expect(revenue).toBeGreaterThanOrEqual(0);
        expect(revenue).toBeLessThanOrEqual(contract);
      }),
    );
  });
});
