import * as z from 'zod';
import { optionalLineSchema } from './fields.js';
import { patchSchema } from './patch.js';

const fields = z.strictObject({
  name: z.string().min(1),
  phone: optionalLineSchema(40),
  address: z.strictObject({ city: optionalLineSchema(80) }).prefault({}),
});

describe('the body of a PATCH', () => {
  const patch = patchSchema(fields);

  it('leaves out what was not sent, so that nothing is emptied by a default', () => {
    expect(patch.parse({ name: 'Alder Court' })).toEqual({ name: 'Alder Court' });
  });

  it('takes an empty text as a wish to empty the field', () => {
    expect(patch.parse({ phone: '' })).toEqual({ phone: '' });
  });

  it('replaces a nested value whole', () => {
    expect(patch.parse({ address: {} })).toEqual({ address: { city: '' } });
  });

  it('keeps the bounds of each field and refuses unknown ones', () => {
    expect(patch.safeParse({ name: '' }).success).toBe(false);
    expect(patch.safeParse({ shopId: 'x' }).success).toBe(false);
  });
});
