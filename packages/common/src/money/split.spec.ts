import fc from 'fast-check';
import { sumCents } from './cents.js';
import { splitCents } from './split.js';

describe('a split', () => {
  // Largest remainder: method in OpenStax Contemporary Mathematics module m00028; the values are computed.
  it.each([
    [7, [50, 30, 20], [4, 2, 1]],
    [10_000, [1, 1, 1], [3_334, 3_333, 3_333]],
    [100_001, [50, 30, 20], [50_001, 30_000, 20_000]],
    [-7, [50, 30, 20], [-4, -2, -1]],
    [0, [1, 2], [0, 0]],
  ])('of %i over %j is %j', (amount, weights, parts) => {
    expect(splitCents(amount, weights)).toEqual(parts);
  });

  it('adds up, and no part is a cent or more from its quota', () => {
    const weights = fc
      .array(fc.nat(10_000), { minLength: 1 })
      .filter((all) => all.some((weight) => weight > 0));
    fc.assert(
      fc.property(fc.integer({ min: -1_000_000, max: 1_000_000 }), weights, (amount, all) => {
        const parts = splitCents(amount, all);
        expect(sumCents(parts)).toBe(amount);
        const total = all.reduce((sum, weight) => sum + weight, 0);
        parts.forEach((part, index) =>
          expect(Math.abs(part - (amount * all[index]!) / total)).toBeLessThan(1),
        );
      }),
    );
  });

  it.each([[[0, 0]], [[1, -1]], [[]]])('is refused over %j', (weights) => {
    expect(() => splitCents(100, weights)).toThrow(RangeError);
  });
});
