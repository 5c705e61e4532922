import fc from 'fast-check';
import { percentToRate, rateToPercent } from './percent.js';

describe('a rate as a percent', () => {
  it.each([
    ['0.0825', '8.25'],
    ['0', '0'],
    ['0.1', '10'],
    ['1', '100'],
    ['0.060000', '6'],
    ['0.000125', '0.0125'],
  ])('%s is %s', (rate, percent) => {
    expect(rateToPercent(rate)).toBe(percent);
  });

  it.each([
    ['8.25', '0.0825'],
    [' 8.25 % ', '0.0825'],
    ['0', '0'],
    ['100', '1'],
    ['6.0', '0.06'],
    ['0.0125', '0.000125'],
  ])('reads %s as %s', (text, rate) => {
    expect(percentToRate(text)).toEqual({ rate });
  });

  it.each(['', 'eight', '8,25', '-1', '1.23456', '1e2', '1000'])('cannot read %j', (text) => {
    expect(percentToRate(text)).toHaveProperty('problem');
  });

  it('comes back the same from every rate there can be', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1_000_000 }), (millionths) => {
        const rate = String(millionths / 1_000_000);
        fc.pre(!rate.includes('e'));
        expect(percentToRate(rateToPercent(rate))).toEqual({ rate });
      }),
    );
  });
});
