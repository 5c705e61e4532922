import fc from 'fast-check';
import { COST_CATEGORIES } from '../estimates/cost-categories.js';
import { costProgress } from './cost-to-cost.js';
import { mirrorBilling, mirrorCosts, mirrorHours, mirrorTotal } from './mirrored-rows.js';

describe('planned and built', () => {
  it('stand beside each other, with the difference and what ran over', () => {
    const rows = mirrorCosts([
      { category: 'material', plannedCents: 64_000, actualCents: 74_800 },
      { category: 'labor', plannedCents: 279_000, actualCents: 245_500 },
    ]);
    expect(rows).toEqual([
      { key: 'material', name: 'Material', planned: 64_000, built: 74_800, difference: 10_800, over: 10_800 },
      { key: 'labor', name: 'Shop labor', planned: 279_000, built: 245_500, difference: -33_500, over: 0 },
    ]);
    expect(mirrorTotal(rows)).toMatchObject({
      planned: 343_000,
      built: 320_300,
      difference: -22_700,
      over: 0,
    });
  });

  it('show time clocked to an operation that nobody planned as all over', () => {
    const row = { operationId: 'x', name: 'Deliver', plannedMinutes: 0, clockedMinutes: 45 };
    expect(mirrorHours([row])[0]).toMatchObject({ planned: 0, built: 45, over: 45 });
  });

  it('show a stage that is not billed as planned only', () => {
    const stage = { billingStageId: 's', name: 'Installed', plannedCents: 282_000, billedCents: 0 };
    expect(mirrorBilling([stage])[0]).toMatchObject({
      planned: 282_000,
      built: 0,
      difference: -282_000,
      over: 0,
    });
  });

  it('add up in the total to the job’s planned and actual cost', () => {
    const rows = fc.array(
      fc.tuple(fc.constantFrom(...COST_CATEGORIES), fc.nat(1_000_000), fc.nat(1_000_000)),
    );
    fc.assert(
      fc.property(rows, (all) => {
        const costs = all.map(([category, plannedCents, actualCents]) => ({
          category,
          plannedCents,
          actualCents,
        }));
        const total = mirrorTotal(mirrorCosts(costs));
        expect(costProgress(costs, false)).toMatchObject({
          plannedCostCents: total.planned,
          actualCostCents: total.built,
        });
      }),
    );
  });
});
