import {
  decimalSchema,
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  notesSchema,
  rateSchema,
} from './fields.js';
import { listQuerySchema } from './list.js';

const takes = (schema: { safeParse(value: unknown): { success: boolean } }, value: unknown) =>
  schema.safeParse(value).success;

describe('fields', () => {
  it.each([
    ['an id', idSchema, '01940000-0000-7000-8000-000000000001', '1e3'],
    ['an instant', instantSchema, '2027-01-14T15:31:00Z', '2027-01-14T15:31:00-06:00'],
    ['a line', lineSchema(5), ' abc ', 'a\nb'],
    ['a line that is not empty', lineSchema(5), 'a', '   '],
    ['notes', notesSchema(), 'one\ntwo', 'a\u0000b'],
    ['an e-mail address', emailSchema, ' Wren@Example.com ', 'wren@example.com\r\nBcc: x@example.com'],
    ['a decimal', decimalSchema(3), '12.125', '12.1255'],
    ['a decimal in digits', decimalSchema(3), '0', '1e3'],
    ['a rate', rateSchema, '0.0825', '8.25'],
  ])('%s', (_, schema, valid, invalid) => {
    expect(takes(schema, valid)).toBe(true);
    expect(takes(schema, invalid)).toBe(false);
  });

  it('trim and lower an e-mail address', () => {
    expect(emailSchema.parse(' Wren@Example.com ')).toBe('wren@example.com');
  });
});

describe('the query of a list', () => {
  const query = listQuerySchema(['name', 'createdAt']);

  it('sorts by its own keys, in both directions', () => {
    expect(query.parse({ sort: '-createdAt', limit: '25' })).toEqual({ sort: '-createdAt', limit: 25 });
  });

  it.each([
    { sort: 'name; drop table customer' },
    { sort: '--name' },
    { limit: '0' },
    { limit: '201' },
    { limit: '1e2' },
    { limit: ['1', '2'] },
    { q: 'x'.repeat(101) },
    { shopId: 'x' },
  ])('refuses %j', (invalid) => {
    expect(query.safeParse(invalid).success).toBe(false);
  });
});
