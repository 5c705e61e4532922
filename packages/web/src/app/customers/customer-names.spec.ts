import { addressLines } from './customer-names';

const address = { street: '12 Quarry Road', street2: '', city: 'Stowe', region: 'VT', postalCode: '05672' };

describe('addressLines', () => {
  it('writes an address as on an envelope, without empty lines', () => {
    expect(addressLines(address)).toEqual(['12 Quarry Road', 'Stowe, VT 05672']);
  });

  it('makes do with what there is', () => {
    expect(addressLines({ ...address, city: '', postalCode: '' })).toEqual(['12 Quarry Road', 'VT']);
    expect(addressLines({ street: '', street2: '', city: '', region: '', postalCode: '' })).toEqual([]);
  });
});
