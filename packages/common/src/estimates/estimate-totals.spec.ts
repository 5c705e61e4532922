import fc from 'fast-check';
import { applyRate, sumCents } from '../money/cents.js';
import { discountShares, estimateTotals, priceRooms } from './estimate-totals.js';
import type { EstimateLine } from './revision-contract.js';

const line = (overrides: Partial<EstimateLine>): EstimateLine => ({
  id: '01930000-0000-7000-8000-000000000001',
  kind: 'material',
  description: 'Birch ply',
  quantity: '1',
  unit: 'each',
  unitCostCents: 0,
  unitPriceCents: 0,
  operationId: null,
  plannedMinutesPerUnit: null,
  taxable: true,
  ...overrides,
});
const revision = (lines: EstimateLine[], overrides = {}) => ({
  rooms: [{ id: '01930000-0000-7000-8000-000000000002', name: 'Kitchen', lines }],
  discountCents: 0,
  taxRule: 'on-price' as const,
  taxRate: '0',
  ...overrides,
});

describe('sales tax', () => {
  // OpenStax, Contemporary Mathematics, module m00058.
  it.each([
    [42_899, '0.0825', 3_539],
    [3_488, '0.0825', 288],
    [49_900, '0.0881', 4_396],
  ])('of %i cents at %s is %i cents', (unitPriceCents, taxRate, taxCents) => {
    const totals = estimateTotals(revision([line({ unitPriceCents })], { taxRate }));
    expect(totals).toMatchObject({ taxCents, totalCents: unitPriceCents + taxCents });
  });

  // SSUTA section 324 (R.I. Gen. Laws 44-18.1-25): to the third decimal, up when it is above four.
  it.each([
    [250, '0.05', 13],
    [10, '0.05', 1],
  ])('rounds half up: %i cents at %s is %i', (unitPriceCents, taxRate, taxCents) => {
    expect(estimateTotals(revision([line({ unitPriceCents })], { taxRate })).taxCents).toBe(taxCents);
  });

  it('is computed once for the whole, not line by line (the invoice basis of SSUTA section 324)', () => {
    const three = [110, 110, 110].map((unitPriceCents) => line({ unitPriceCents }));
    expect(estimateTotals(revision(three, { taxRate: '0.07' })).taxCents).toBe(23);
    expect(3 * applyRate(110, '0.07')).toBe(24);
  });

  it.each(['shop-pays-use-tax', 'exempt'] as const)('is none under the rule %s', (taxRule) => {
    const totals = estimateTotals(revision([line({ unitPriceCents: 10_000 })], { taxRule, taxRate: '0.07' }));
    expect(totals).toMatchObject({ taxableCents: 0, taxCents: 0, totalCents: 10_000 });
  });

  it('leaves out lines that are not taxable, each with its own share of the discount', () => {
    const lines = [line({ unitPriceCents: 60_000 }), line({ unitPriceCents: 40_000, taxable: false })];
    const totals = estimateTotals(revision(lines, { taxRate: '0.10', discountCents: 10_000 }));
    expect(totals).toMatchObject({
      netCents: 90_000,
      taxableCents: 54_000,
      taxCents: 5_400,
      totalCents: 95_400,
    });
  });
});

describe('markup and margin', () => {
  // OpenStax, Contemporary Mathematics, module m00058: 480 sold at 840 is a markup of 75 %; margin is .75 / 1.75.
  it.each([
    [48_000, 84_000, '0.75', '0.4286'],
    [9_000, 10_350, '0.15', '0.1304'],
    [520, 990, '0.9038', '0.4747'],
  ])('cost %i sold at %i: markup %s, margin %s', (unitCostCents, unitPriceCents, markup, margin) => {
    expect(estimateTotals(revision([line({ unitCostCents, unitPriceCents })]))).toMatchObject({
      markup,
      margin,
    });
  });

  it('has no margin of nothing', () => {
    expect(estimateTotals(revision([]))).toMatchObject({ totalCents: 0, margin: null, markup: null });
  });

  it('can be below zero', () => {
    const totals = estimateTotals(revision([line({ unitCostCents: 200, unitPriceCents: 100 })]));
    expect(totals).toMatchObject({ marginCents: -100, margin: '-1', markup: '-0.5' });
  });
});

describe('planned cost and time', () => {
  const cut = '01930000-0000-7000-8000-00000000000a';
  const lines = [
    line({
      kind: 'labor',
      unit: 'hour',
      quantity: '7.5',
      unitCostCents: 3_200,
      operationId: cut,
      plannedMinutesPerUnit: '60',
    }),
    line({
      kind: 'material',
      quantity: '3',
      unitCostCents: 8_900,
      operationId: cut,
      plannedMinutesPerUnit: '12.5',
    }),
    line({ kind: 'hardware', quantity: '12', unitCostCents: 245 }),
  ];

  it('adds up cost by category, in the order of the categories', () => {
    expect(estimateTotals(revision(lines)).plannedCostByCategory).toEqual([
      { kind: 'material', costCents: 26_700 },
      { kind: 'hardware', costCents: 2_940 },
      { kind: 'labor', costCents: 24_000 },
    ]);
  });

  it('adds up minutes by operation, half a minute up', () => {
    expect(estimateTotals(revision(lines)).plannedMinutesByOperation).toEqual([
      { operationId: cut, plannedMinutes: 450 + 38 },
    ]);
  });
});

describe('every estimate', () => {
  const lines = fc.array(
    fc
      .record({
        quantity: fc.integer({ min: 0, max: 9_999_999 }).map((n) => (n / 1000).toFixed(3)),
        unitPriceCents: fc.integer({ min: 0, max: 500_000 }),
        unitCostCents: fc.integer({ min: 0, max: 500_000 }),
        taxable: fc.boolean(),
      })
      .map(line),
    { maxLength: 20 },
  );
  const rate = fc.integer({ min: 0, max: 1_000_000 }).map((n) => (n / 1_000_000).toFixed(6));

  it('adds up: lines to rooms to subtotal, less discount, plus tax, to the total', () => {
    fc.assert(
      fc.property(lines, lines, fc.nat(1_000_000), rate, (first, second, discountCents, taxRate) => {
        const rooms = [
          { id: 'a', name: 'A', lines: first },
          { id: 'b', name: 'B', lines: second },
        ];
        const totals = estimateTotals({ rooms, discountCents, taxRule: 'on-price', taxRate });
        const priced = priceRooms(rooms);
        const amounts = priced.flatMap((room) => room.lines.map((priceOf) => priceOf.amountCents));
        expect(sumCents(amounts)).toBe(totals.subtotalCents);
        expect(sumCents(priced.map((room) => room.amountCents))).toBe(totals.subtotalCents);
        expect(totals.subtotalCents - totals.discountCents).toBe(totals.netCents);
        expect(totals.netCents + totals.taxCents).toBe(totals.totalCents);
        expect(totals.netCents - totals.plannedCostCents).toBe(totals.marginCents);
        expect(totals.taxableCents).toBeGreaterThanOrEqual(0);
        expect(totals.taxableCents).toBeLessThanOrEqual(totals.netCents);
      }),
    );
  });

  it('spreads a discount to the cent and takes no line below zero', () => {
    fc.assert(
      fc.property(
        fc.array(fc.nat(1_000_000), { minLength: 1 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (amounts, part) => {
          const discount = Math.floor(sumCents(amounts) * part);
          const shares = discountShares(amounts, discount);
          expect(sumCents(shares)).toBe(discount);
          shares.forEach((share, index) => expect(share).toBeLessThanOrEqual(amounts[index]!));
        },
      ),
    );
  });
});
