import { totalsSoFar } from './invoice-form-group';

const line = { id: 'a', description: '', quantity: '2', unitPriceCents: 1000, taxable: true };

describe('totalsSoFar', () => {
  it('counts what can be read, with tax on what is taxed', () => {
    const lines = [line, { ...line, taxable: false }, { ...line, unitPriceCents: -500 }];
    expect(totalsSoFar({ lines, taxRate: '0.1' })).toEqual({
      netCents: 3000,
      taxCents: 100,
      totalCents: 3100,
    });
  });

  it('counts nothing for a line or a rate that is still being typed', () => {
    const typing = [line, { ...line, quantity: '1.' }, { ...line, unitPriceCents: null }];
    expect(totalsSoFar({ lines: typing, taxRate: '' })).toEqual({
      netCents: 2000,
      taxCents: 0,
      totalCents: 2000,
    });
  });
});
