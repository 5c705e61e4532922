import { taxWords } from './tax-words.js';

describe('how an estimate speaks of its tax', () => {
  const price = { taxRate: '0.0825', taxableCents: 123_450, currency: 'USD' };

  it('names the rate and what it was computed on', () => {
    expect(taxWords({ ...price, taxRule: 'on-price' })).toEqual({
      label: 'Sales tax 8.25%',
      note: 'Sales tax is computed once, on $1,234.50 of taxable work.',
    });
  });

  it('has no row of tax where none is added, and says why', () => {
    for (const taxRule of ['exempt', 'shop-pays-use-tax'] as const) {
      const { label, note } = taxWords({ ...price, taxRule });
      expect(label).toBeNull();
      expect(note).toContain('No sales tax is added');
    }
  });
});
