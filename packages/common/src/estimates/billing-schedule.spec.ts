import fc from 'fast-check';
import { sumCents } from '../money/cents.js';
import type { BillingShare, BillingStage } from './billing-schedule-contract.js';
import { billSchedule, billScheduleSoFar, refuseSchedule } from './billing-schedule.js';
import { depositsAreEarned, invoiceKindOfStage } from './billing-stage-kind.js';

const schedule = (...shares: BillingShare[]): BillingStage[] =>
  shares.map((share, index) => ({
    id: `stage-${index}`,
    name: `Stage ${index + 1}`,
    share,
    deposit: index === 0,
    due: 'by-hand',
  }));
const price = (netCents: number, taxCents = 0) => ({ netCents, taxCents, totalCents: netCents + taxCents });
const totals = (stages: BillingStage[], netCents: number) =>
  billSchedule(stages, price(netCents)).map((stage) => stage.totalCents);

describe('a billing schedule', () => {
  const fiftyThirtyTwenty = schedule({ percent: '50' }, { percent: '30' }, { percent: '20' });

  // Hamilton's method of apportionment, OpenStax Contemporary Mathematics module m00028; the values are computed.
  it.each([
    [7, [4, 2, 1]],
    [100_001, [50_001, 30_000, 20_000]],
  ])('splits %i cents over 50, 30 and 20 percent by largest remainder', (cents, expected) => {
    expect(totals(fiftyThirtyTwenty, cents)).toEqual(expected);
  });

  it('gives the same whether the last share is said in percent or as the remainder', () => {
    const withRemainder = schedule({ percent: '50' }, { percent: '30' }, { remainder: true });
    expect(totals(withRemainder, 7)).toEqual(totals(fiftyThirtyTwenty, 7));
  });

  it('keeps an amount as it is, takes percents of the whole price, and bills the rest last', () => {
    const mixed = schedule({ amountCents: 150_000 }, { percent: '40' }, { remainder: true });
    expect(totals(mixed, 1_000_000)).toEqual([150_000, 400_000, 450_000]);
  });

  it('takes amounts and percents without a remainder when they come to the price', () => {
    expect(totals(schedule({ amountCents: 4_001 }, { percent: '60' }), 10_001)).toEqual([4_001, 6_000]);
  });

  it('gives each stage its share of the tax', () => {
    const stages = billSchedule(fiftyThirtyTwenty, price(100_000, 8_250));
    expect(stages.map(({ netCents, taxCents }) => [netCents, taxCents])).toEqual([
      [50_000, 4_125],
      [30_000, 2_475],
      [20_000, 1_650],
    ]);
  });

  it.each<[string, BillingStage[], number, RegExp]>([
    ['percents below 100', schedule({ percent: '50' }, { percent: '49.999' }), 100, /99\.999 %/],
    ['percents above 100', schedule({ percent: '50' }, { percent: '60' }), 100, /110 %/],
    ['two remainders', schedule({ remainder: true }, { remainder: true }), 100, /Only one/],
    [
      'amounts below the price',
      schedule({ amountCents: 60 }, { amountCents: 30 }),
      100,
      /less than the price/,
    ],
    ['amounts above the price', schedule({ amountCents: 60 }, { percent: '50' }), 100, /more than the price/],
    [
      'nothing left for the remainder',
      schedule({ percent: '100' }, { remainder: true }),
      100,
      /nothing is left/,
    ],
    ['a stage of nothing', schedule({ percent: '100' }, { percent: '0' }), 100, /Stage 2 bills nothing/],
    ['no price', schedule({ percent: '100' }), 0, /no price/],
  ])('is refused with %s', (_, stages, cents, sentence) => {
    expect(refuseSchedule(stages, cents)?.detail).toMatch(sentence);
    expect(() => billSchedule(stages, price(cents))).toThrow(RangeError);
    expect(billScheduleSoFar(stages, price(cents)).map((stage) => stage.totalCents)).toEqual(
      stages.map(() => 0),
    );
  });

  const percents = fc
    .array(fc.integer({ min: 1, max: 20_000 }), { minLength: 1, maxLength: 5 })
    .map((parts) => parts.map((part) => ({ percent: (part / 1000).toFixed(3) })));

  it('adds up to net, tax and total to the cent, whatever it is made of', () => {
    fc.assert(
      fc.property(
        percents,
        fc.option(fc.integer({ min: 1, max: 100_000 })),
        fc.integer({ min: 1, max: 10_000_000 }),
        fc.nat(900_000),
        (shares, amount, netCents, taxCents) => {
          const fixed = amount === null ? [] : [{ amountCents: amount }];
          const stages = schedule(...shares, ...fixed, { remainder: true });
          const of = price(netCents, Math.min(taxCents, netCents));
          fc.pre(refuseSchedule(stages, of.totalCents) === null);
          const billed = billSchedule(stages, of);
          expect(sumCents(billed.map((stage) => stage.netCents))).toBe(of.netCents);
          expect(sumCents(billed.map((stage) => stage.taxCents))).toBe(of.taxCents);
          expect(sumCents(billed.map((stage) => stage.totalCents))).toBe(of.totalCents);
          billed.forEach((stage) => expect(stage.netCents).toBeGreaterThanOrEqual(0));
          if (amount !== null)
            expect(billed.find((stage) => 'amountCents' in stage.share)?.totalCents).toBe(amount);
        },
      ),
    );
  });
});

describe('the invoice of a stage', () => {
  const stages = schedule({ percent: '40' }, { percent: '40' }, { percent: '20' });

  it('is a deposit, progress, or the final one', () => {
    expect(stages.map((stage) => invoiceKindOfStage(stages, stage.id))).toEqual([
      'deposit',
      'progress',
      'final',
    ]);
  });

  it('earns the deposits once all other stages are invoiced, in any order', () => {
    expect(depositsAreEarned(stages, ['stage-0', 'stage-2'], false)).toBe(false);
    expect(depositsAreEarned(stages, ['stage-2', 'stage-1'], false)).toBe(true);
  });

  it('earns the deposits when the job is closed, and not before if all stages are deposits', () => {
    const only = stages.slice(0, 1);
    expect(depositsAreEarned(only, ['stage-0'], false)).toBe(false);
    expect(depositsAreEarned(only, ['stage-0'], true)).toBe(true);
  });
});
