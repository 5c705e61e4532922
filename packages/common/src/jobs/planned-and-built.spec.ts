import fc from 'fast-check';
import { COST_CATEGORIES } from '../estimates/cost-categories.js';
import { sumCents } from '../money/cents.js';
import { costRows, jobProgress, type ProgressFacts } from './planned-and-built.js';
import type { JobCostRow } from './jobs-contract.js';

const facts = (overrides: Partial<ProgressFacts> = {}): ProgressFacts => ({
  costs: [{ category: 'material', plannedCents: 10_000, actualCents: 0 }],
  contractNetCents: 20_000,
  billedNetCents: 0,
  closed: false,
  ...overrides,
});

describe('costs by category', () => {
  it('stand in one order, each with its plan and all that was spent on it', () => {
    const rows = costRows(
      [
        { category: 'install', plannedCents: 500 },
        { category: 'material', plannedCents: 2_000 },
      ],
      [
        { category: 'hardware', amountCents: 90 },
        { category: 'material', amountCents: 1_200 },
        { category: 'material', amountCents: -200 },
      ],
    );
    expect(rows).toEqual([
      { category: 'material', plannedCents: 2_000, actualCents: 1_000 },
      { category: 'hardware', plannedCents: 0, actualCents: 90 },
      { category: 'install', plannedCents: 500, actualCents: 0 },
    ]);
  });
});

describe('progress', () => {
  // IFRS 15, Illustrative Example 19: 500,000 of 2,500,000 spent is 20 % complete, and earns 700,000 of 3,500,000.
  it('is cost so far over expected cost', () => {
    const progress = jobProgress(
      facts({
        costs: [{ category: 'labor', plannedCents: 2_500_000, actualCents: 500_000 }],
        contractNetCents: 3_500_000,
      }),
    );
    expect(progress).toMatchObject({ percentComplete: '0.2', earnedCents: 700_000 });
  });

  it('expects what a category is planned at, or what it cost once that is more', () => {
    const progress = jobProgress(
      facts({
        costs: [
          { category: 'material', plannedCents: 10_000, actualCents: 12_500 },
          { category: 'labor', plannedCents: 10_000, actualCents: 2_500 },
        ],
      }),
    );
    expect(progress).toMatchObject({
      expectedCostCents: 22_500,
      percentComplete: '0.6667',
      earnedCents: 13_333,
    });
  });

  it('lays what was billed beside what was earned', () => {
    const costs: JobCostRow[] = [{ category: 'material', plannedCents: 10_000, actualCents: 5_000 }];
    expect(jobProgress(facts({ costs, billedNetCents: 15_000 })).overBilledCents).toBe(5_000);
    expect(jobProgress(facts({ costs, billedNetCents: 4_000 })).overBilledCents).toBe(-6_000);
  });

  it('is not known when no cost was planned', () => {
    const costs: JobCostRow[] = [{ category: 'material', plannedCents: 0, actualCents: 700 }];
    expect(jobProgress(facts({ costs }))).toMatchObject({ percentComplete: null, earnedCents: 0 });
  });

  it('is whole when the job is closed, whatever it cost', () => {
    const progress = jobProgress(facts({ closed: true, billedNetCents: 20_000 }));
    expect(progress).toMatchObject({
      expectedCostCents: 0,
      percentComplete: '1',
      earnedCents: 20_000,
      overBilledCents: 0,
    });
  });

  it('stays between nothing and all of the contract, for any costs', () => {
    const row = fc.record({
      category: fc.constantFrom(...COST_CATEGORIES),
      plannedCents: fc.nat(100_000_000),
      actualCents: fc.nat(100_000_000),
    });
    fc.assert(
      fc.property(fc.array(row), fc.nat(1_000_000_000), fc.boolean(), (costs, contractNetCents, closed) => {
        const progress = jobProgress(facts({ costs, contractNetCents, closed }));
        expect(progress.earnedCents).toBeGreaterThanOrEqual(0);
        expect(progress.earnedCents).toBeLessThanOrEqual(contractNetCents);
        expect(progress.actualCostCents).toBe(sumCents(costs.map((each) => each.actualCents)));
        if (!closed) expect(progress.expectedCostCents).toBeGreaterThanOrEqual(progress.actualCostCents);
      }),
    );
  });
});
