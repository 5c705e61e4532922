import fc from 'fast-check';
import { canonicalJson } from './canonical-json.js';

describe('canonical JSON', () => {
  // The names and their order in RFC 8785 section 3.2.3, from memory.
  it('sorts keys by UTF-16 code units', () => {
    const names = { '\u20ac': 1, '\r': 2, '\ufb33': 3, '1': 4, '\ud83d\ude00': 5, '\u0080': 6, '\u00f6': 7 };
    expect(canonicalJson(names)).toBe(
      '{"\\r":2,"1":4,"\u0080":6,"\u00f6":7,"\u20ac":1,"\ud83d\ude00":5,"\ufb33":3}',
    );
  });

  it('is one text for equal data, whatever order the keys came in, and reads back as the same data', () => {
    fc.assert(
      fc.property(fc.dictionary(fc.string(), fc.jsonValue({ maxDepth: 3 })), (value) => {
        const reversed = Object.fromEntries(Object.entries(value).reverse());
        expect(canonicalJson(reversed)).toBe(canonicalJson(value));
        expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value)));
      }),
    );
  });

  it('refuses what JSON cannot say', () => {
    expect(() => canonicalJson({ a: Number.NaN })).toThrow(RangeError);
  });
});
