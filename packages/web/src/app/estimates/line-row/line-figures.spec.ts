import { buildLine } from '@bookmatch/common/testing/build-estimate';
import { lineFigures, priceAtMarkup } from './line-figures';

describe('a line while it is typed', () => {
  it('comes to its quantity at its price and its cost', () => {
    const line = buildLine({ quantity: '2.5', unitCostCents: 8_900, unitPriceCents: 12_401 });
    expect(lineFigures(line)).toEqual({ amountCents: 31_003, costCents: 22_250 });
  });

  it('comes to nothing while its quantity cannot be read', () => {
    expect(lineFigures(buildLine({ quantity: '2,5' }))).toEqual({ amountCents: 0, costCents: 0 });
    expect(lineFigures(undefined)).toEqual({ amountCents: 0, costCents: 0 });
  });

  it('takes a price from a markup on the cost, half up', () => {
    expect(priceAtMarkup(8_905, '40')).toBe(12_467);
    expect(priceAtMarkup(8_905, '0')).toBe(8_905);
    expect(priceAtMarkup(8_905, 'much')).toBeNull();
  });
});
