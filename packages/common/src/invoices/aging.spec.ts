import fc from 'fast-check';
import { addDays } from '../calendar/shop-dates.js';
import { sumCents } from '../money/cents.js';
import { ageBalances, bucketOf } from './aging.js';

const on = '2027-03-15';
const owed = (customerId: string, daysPastDue: number, balanceCents: number) => ({
  customerId,
  customerName: `Customer ${customerId}`,
  dueOn: addDays(on, -daysPastDue),
  balanceCents,
});

describe('aging', () => {
  it.each([
    [-10, 'currentCents'],
    [0, 'currentCents'],
    [1, 'days1To30Cents'],
    [30, 'days1To30Cents'],
    [31, 'days31To60Cents'],
    [60, 'days31To60Cents'],
    [61, 'days61To90Cents'],
    [90, 'days61To90Cents'],
    [91, 'over90Cents'],
  ])('puts what is %i days past due into %s', (days, bucket) => {
    expect(bucketOf(days)).toBe(bucket);
  });

  // OpenStax, Principles of Accounting 1, module m67882: receivables by age come to $324,850 in all. Its buckets are
  // wider than ours, so each falls in one or two of them.
  it('adds buckets up to the receivables', () => {
    const aging = ageBalances(
      [
        owed('a', 20, 14_574_000),
        owed('b', 45, 5_210_000),
        owed('b', 75, 5_000_000),
        owed('c', 120, 7_701_000),
      ],
      on,
    );
    expect(aging.totals).toEqual({
      currentCents: 0,
      days1To30Cents: 14_574_000,
      days31To60Cents: 5_210_000,
      days61To90Cents: 5_000_000,
      over90Cents: 7_701_000,
      totalCents: 32_485_000,
    });
    expect(aging.rows.map((row) => row.customerId)).toEqual(['a', 'b', 'c']);
  });

  it('loses no cent, by row or by bucket', () => {
    const balances = fc.array(
      fc
        .tuple(
          fc.constantFrom('a', 'b', 'c'),
          fc.integer({ min: -60, max: 400 }),
          fc.integer({ min: 1, max: 1_000_000 }),
        )
        .map(([customer, days, cents]) => owed(customer, days, cents)),
    );
    fc.assert(
      fc.property(balances, (all) => {
        const { rows, totals } = ageBalances(all, on);
        const { totalCents, ...buckets } = totals;
        expect(totalCents).toBe(sumCents(all.map((balance) => balance.balanceCents)));
        expect(sumCents(Object.values(buckets))).toBe(totalCents);
        expect(sumCents(rows.map((row) => row.totalCents))).toBe(totalCents);
      }),
    );
  });
});
