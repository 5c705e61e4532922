import fc from 'fast-check';
import { MAX_CENTS } from './cents.js';
import { formatAmount, formatDifference, formatMoney, formatRate } from './format.js';
import { parseMoney } from './parse.js';

describe('a money field', () => {
  it.each([
    ['1,250', 125_000],
    ['$1250.00', 125_000],
    ['1 250', 125_000],
    ['1\u00a0250.5', 125_050],
    [' $ 1,234,567.89 ', 123_456_789],
    ['.5', 50],
    ['7.', 700],
    ['0', 0],
    ['-5', -500],
    ['\u22125', -500],
    ['$-5', -500],
    ['-$5.25', -525],
    ['(5)', -500],
    ['-0', 0],
  ])('reads %j as %i cents', (text, cents) => {
    expect(parseMoney(text)).toEqual({ cents });
  });

  it.each([
    '',
    ' ',
    '.',
    'abc',
    '1.2.3',
    '12,50',
    '1,2500',
    '1 25',
    '1e5',
    '--5',
    '-(5)',
    '5-',
    '$',
    '1,250 000',
    '(5',
  ])('does not guess at %j', (text) => {
    expect(parseMoney(text)).toHaveProperty('problem');
  });

  it('refuses a third decimal rather than round it, and amounts without bound', () => {
    expect(parseMoney('1.005')).toEqual({ problem: 'An amount has at most two decimals.' });
    expect(parseMoney('100000000')).toEqual({ problem: 'This amount is too large.' });
  });

  it('reads back everything it shows', () => {
    fc.assert(
      fc.property(fc.integer({ min: -MAX_CENTS, max: MAX_CENTS }), (cents) => {
        expect(parseMoney(formatMoney(cents, 'USD'))).toEqual({ cents });
        expect(parseMoney(formatAmount(cents))).toEqual({ cents });
      }),
    );
  });
});

describe('money as shown', () => {
  it('has a true minus and the currency', () => {
    expect(formatMoney(125_000, 'USD')).toBe('$1,250.00');
    expect(formatMoney(-500, 'USD')).toBe('\u2212$5.00');
    expect(formatMoney(-0, 'USD')).toBe('$0.00');
    expect(formatMoney(125_000, 'CAD')).toBe('CA$1,250.00');
    expect(formatAmount(-5)).toBe('\u22120.05');
  });

  it('shows the sign of a difference', () => {
    expect([10_800, -700, 0].map((cents) => formatDifference(cents, 'USD'))).toEqual([
      '+$108.00',
      '\u2212$7.00',
      '$0.00',
    ]);
  });

  it('shows a rate as a percent', () => {
    expect(['0.0825', '0.4286', '-0.5', '1'].map((rate) => formatRate(rate, 2))).toEqual([
      '8.25%',
      '42.86%',
      '\u221250%',
      '100%',
    ]);
  });
});
