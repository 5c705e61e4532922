import * as z from 'zod';
import { lineSchema } from './fields.js';
import { plainMessage } from './plain-messages.js';

const schema = z.strictObject({
  name: lineSchema(5, 'The name'),
  count: z.int(),
  open: z.boolean(),
  kind: z.enum(['a', 'b']),
  rows: z.array(z.string()).max(1),
});

function messages(value: unknown): Record<string, string> {
  const parsed = schema.safeParse(value, { error: plainMessage });
  return Object.fromEntries(
    (parsed.error?.issues ?? []).map(({ path, message }) => [path.join('.'), message]),
  );
}

describe('plain messages', () => {
  it('says what is missing without the language of types', () => {
    expect(messages({})).toEqual({
      name: 'This is needed.',
      count: 'This is needed.',
      open: 'This is needed.',
      kind: 'Choose one of the offered values.',
      rows: 'This is needed.',
    });
  });

  it("leaves a schema's own words alone", () => {
    const found = messages({ name: 'too long', count: 1.5, open: 'yes', kind: 'c', rows: ['1', '2'] });
    expect(found['name']).toBe('The name can have at most 5 characters.');
    expect(found['open']).toBe('Give yes or no.');
    expect(Object.values(found).join(' ')).not.toMatch(/expected|received|Invalid/);
  });
});
