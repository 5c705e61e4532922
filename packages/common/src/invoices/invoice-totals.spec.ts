import fc from 'fast-check';
import { sumCents } from '../money/cents.js';
import { invoiceTotals, issueRefusals, priceInvoiceLines } from './invoice-totals.js';

const line = (quantity: string, unitPriceCents: number, taxable = true) => ({
  id: '01930000-0000-7000-8000-000000000001',
  description: 'Extra shelf',
  quantity,
  unitPriceCents,
  taxable,
});

describe('a free invoice', () => {
  // SSUTA section 324, invoice basis: three items of $1.10 at 7 % are taxed 23 cents, not three times 8.
  it('is taxed once on the sum of its taxable lines', () => {
    expect(
      invoiceTotals([line('1', 110), line('1', 110), line('1', 110), line('1', 5_000, false)], '0.07'),
    ).toEqual({
      netCents: 5_330,
      taxCents: 23,
      totalCents: 5_353,
    });
  });

  it('adds up for any lines', () => {
    const lines = fc.array(
      fc
        .tuple(fc.integer({ min: 0, max: 99_999 }), fc.integer({ min: -50_000, max: 50_000 }), fc.boolean())
        .map(([quantity, price, taxable]) => line((quantity / 1000).toFixed(3), price, taxable)),
    );
    fc.assert(
      fc.property(lines, (all) => {
        const totals = invoiceTotals(all, '0.0825');
        expect(sumCents(priceInvoiceLines(all).map((priced) => priced.amountCents))).toBe(totals.netCents);
        expect(totals.netCents + totals.taxCents).toBe(totals.totalCents);
      }),
    );
  });

  it.each([
    ['no lines', [], /nothing to bill/],
    ['nothing to pay', [line('1', 100), line('1', -100)], /more than zero/],
    ['more taken off than billed', [line('1', 100), line('1', -200)], /more than what is billed/],
    [
      'a credit larger than what is taxed',
      [line('1', 900, false), line('1', -200)],
      /more than what is billed/,
    ],
  ])('cannot be issued with %s', (_, lines, sentence) => {
    expect(issueRefusals(lines, invoiceTotals(lines, '0.0825')).join(' ')).toMatch(sentence);
  });

  it('can be issued with something to pay', () => {
    expect(issueRefusals([line('2', 100)], invoiceTotals([line('2', 100)], '0'))).toEqual([]);
  });
});
