import { applyRate, extend, roundHalfUp } from './cents.js';
import { Decimal } from 'decimal.js';

describe('rounding to the cent', () => {
  it.each([
    ['12.5', 13],
    ['0.5', 1],
    ['0.49999', 0],
    ['-12.5', -13],
  ])('takes %s to %i', (value, cents) => {
    expect(roundHalfUp(new Decimal(value))).toBe(cents);
  });

  it('is exact where binary fractions are not', () => {
    expect(extend('1.005', 100)).toBe(101);
    expect(applyRate(1_075, '0.1')).toBe(108);
  });
});
