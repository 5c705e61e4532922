import { buildLine, buildRevisionContent, buildRoom } from '../testing/build-estimate.js';
import { saveRevisionSchema } from './revision-contract.js';
import { sendRefusals } from './send-refusals.js';

const today = '2027-01-14';

describe('a draft revision', () => {
  it('can be sent when it is whole', () => {
    expect(sendRefusals(buildRevisionContent(), today)).toEqual([]);
  });

  it.each([
    ['without lines', { rooms: [buildRoom({ lines: [] })] }, /nothing to offer/],
    ['with a discount above the price', { discountCents: 37_201 }, /discount is more/],
    ['valid until yesterday', { validUntil: '2027-01-13' }, /has passed/],
    ['with a schedule that does not add up', { billingSchedule: [] }, /0 % of the price/],
  ])('cannot be sent %s, and says why', (_, overrides, sentence) => {
    expect(sendRefusals(buildRevisionContent(overrides), today).join(' ')).toMatch(sentence);
  });

  it('can be saved before it can be sent', () => {
    expect(saveRevisionSchema.safeParse(buildRevisionContent({ rooms: [], discountCents: 5 })).success).toBe(
      true,
    );
  });

  const same = buildLine();
  it.each([
    ['a line twice', { rooms: [buildRoom({ lines: [same, same] })] }],
    [
      'a price beyond bounds',
      { rooms: [buildRoom({ lines: [buildLine({ quantity: '1000', unitPriceCents: 5_000_000 })] })] },
    ],
    [
      'a cost beyond bounds',
      { rooms: [buildRoom({ lines: [buildLine({ quantity: '1000', unitCostCents: 5_000_000 })] })] },
    ],
    ['a quantity in words', { rooms: [buildRoom({ lines: [buildLine({ quantity: 'three' })] })] }],
    ['a fourth decimal', { rooms: [buildRoom({ lines: [buildLine({ quantity: '1.2345' })] })] }],
    ['a tax rate above one', { taxRate: '8.25' }],
    ['an id of the shop', { shopId: 'x' }],
  ])('cannot be saved with %s', (_, overrides) => {
    expect(saveRevisionSchema.safeParse({ ...buildRevisionContent(), ...overrides }).success).toBe(false);
  });
});
