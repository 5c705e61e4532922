import { buildJob, buildJobMoney, buildJobOperation } from '@bookmatch/common/testing/build-job';
import { actualName, billingLeaves, costLeaves, hourLeaves, paceNote } from './job-leaves';

const money = buildJobMoney({
  costs: [
    { category: 'material', plannedCents: 10_000, actualCents: 12_500 },
    { category: 'install', plannedCents: 5_000, actualCents: 0 },
  ],
});
const dollars = (cents: number) => `$${cents / 100}`;

describe("a job's mirrored pairs", () => {
  it('name what was not started while the job is open, and not once it is closed', () => {
    expect(costLeaves(money, false).map(({ name, note }) => [name, note])).toEqual([
      ['Material', undefined],
      ['Install', 'not started'],
    ]);
    expect(costLeaves(money, true)[1]?.note).toBeUndefined();
  });

  it('give time that was clocked without a plan its own row', () => {
    const rows = hourLeaves(
      buildJob({
        operations: [buildJobOperation({ name: 'Deliver', plannedMinutes: 0, clockedMinutes: 45 })],
      }),
    );
    expect(rows).toMatchObject([{ name: 'Deliver', planned: 0, built: 45, note: undefined }]);
  });

  it('give invoices outside of the schedule a row of their own, so that the total is what was billed', () => {
    const rows = billingLeaves({ ...money, billing: [], billedCents: 700 });
    expect(rows).toMatchObject([{ name: 'Other invoices', planned: 0, built: 700 }]);
  });

  it('say how far the job is and what it is on pace for', () => {
    expect(actualName({ ...money, percentComplete: '0.7143' }, false)).toBe('Actual to date, 71% complete');
    expect(actualName({ ...money, percentComplete: null }, false)).toBe('Actual to date');
    expect(actualName(money, true)).toBe('Actual');
    expect(paceNote(money, false, dollars)).toBe('on pace for $175');
    expect(paceNote({ ...money, actualCostCents: 0 }, false, dollars)).toBeUndefined();
    expect(paceNote(money, true, dollars)).toBeUndefined();
  });
});
