import fc from 'fast-check';
import { Fraction } from 'fraction.js';
import { formatLength } from './format-length.js';
import { storedMillimeters } from './length.js';
import { parseLength } from './parse-length.js';

function millimeters(typed: string, system: 'inch' | 'metric' = 'inch'): string {
  const reading = parseLength(typed, system);
  return 'problem' in reading ? reading.problem : storedMillimeters(reading.millimeters);
}

describe('a length as a maker types it', () => {
  // 25.4 mm an inch, exactly (NIST Handbook 44, appendix C).
  it.each([
    ['23 5/8', '600.075'],
    ['23-5/8"', '600.075'],
    ['23 - 5/8 in', '600.075'],
    ['23\u215d\u2033', '600.075'],
    ['23 5\u20448', '600.075'],
    ['23.625', '600.075'],
    ["1' 11 5/8", '600.075'],
    ['1\'-11 5/8"', '600.075'],
    ['1\u2032 11\u215d\u2033', '600.075'],
    ['1 ft 11 5/8 in', '600.075'],
    ['1\u2019 11 5/8\u201d', '600.075'],
    ["1'11 5/8''", '600.075'],
    ["7'", '2133.6'],
    ['6 1/2 ft', '1981.2'],
    ['600mm', '600'],
    ['60 cm', '600'],
    ['0.6 m', '600'],
    ['.75', '19.05'],
    ['3/4', '19.05'],
    ['\u00be', '19.05'],
    ['9/8', '28.575'],
    ['12.', '304.8'],
    ['0', '0'],
    ['1/64', '0.397'],
  ])('%j is %s mm', (typed, expected) => {
    expect(millimeters(typed)).toBe(expected);
  });

  it('is inches or millimeters without a unit, as the shop measures', () => {
    expect(millimeters('24')).toBe('609.6');
    expect(millimeters('24', 'metric')).toBe('24');
    expect(millimeters('24"', 'metric')).toBe('609.6');
    expect(millimeters("1' 6", 'metric')).toBe('457.2');
  });

  it('is kept exactly where millimeters have no end', () => {
    const third = parseLength('1/3', 'inch');
    expect('millimeters' in third && third.millimeters.equals(new Fraction(254, 30))).toBe(true);
  });

  it.each([
    ['-5', /below zero/],
    ['\u22125 1/2', /below zero/],
    ['23 9/8', /less than one/],
    ['23 8/8', /less than one/],
    ['1/0', /Give a length/],
    ['23 5/8 6', /Give a length/],
    ['1,200', /Give a length/],
    ['12 feet 3 mm', /Give a length/],
    ['5"6\'', /Give a length/],
    ['mm', /Give a length/],
    ['', /Give a length/],
    ['1e3', /Give a length/],
    ['9'.repeat(60), /Give a length/],
    ['200 m', /too large/],
  ])('does not guess at %j', (typed, sentence) => {
    expect(millimeters(typed)).toMatch(sentence);
  });

  it('never hangs or throws, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 200 }), (typed) => expect(parseLength(typed, 'inch')).toBeDefined()),
    );
  });
});

describe('a length as shown', () => {
  it.each([
    ['600.075', '23 5/8"', true],
    ['0.397', '1/64"', true],
    ['609.6', '24"', true],
    ['0', '0"', true],
    ['600', '23 5/8"', false],
    ['19', '3/4"', false],
  ])('%s mm is %s (exact: %s)', (stored, text, exact) => {
    expect(formatLength(stored, 'inch')).toEqual({ text, exact });
  });

  it('rounds to the mark that is asked for', () => {
    expect(formatLength('0.397', 'inch', 32)).toEqual({ text: '1/32"', exact: false });
    expect(formatLength('600.075', 'inch', 16)).toEqual({ text: '23 5/8"', exact: true });
  });

  it('is in millimeters to a tenth for a metric shop', () => {
    expect(formatLength('600', 'metric')).toEqual({ text: '600 mm', exact: true });
    expect(formatLength('600.075', 'metric')).toEqual({ text: '600.1 mm', exact: false });
  });

  it('reads back as itself, from every mark of the rule, through storage', () => {
    fc.assert(
      fc.property(fc.nat(64 * 3_000), (sixtyFourths) => {
        const inches = new Fraction(sixtyFourths, 64);
        const shown = formatLength(storedMillimeters(inches.mul(254).div(10)), 'inch');
        expect(shown.exact).toBe(true);
        const reading = parseLength(shown.text, 'metric');
        expect('millimeters' in reading && reading.millimeters.equals(inches.mul(254).div(10))).toBe(true);
      }),
    );
  });
});
