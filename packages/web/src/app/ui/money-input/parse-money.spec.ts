import { parseMoney } from './parse-money';

describe('parseMoney', () => {
  it.each([
    ['1250', 125_000],
    ['1,250', 125_000],
    ['1,250.00', 125_000],
    ['$1,250.5', 125_050],
    [' .50 ', 50],
    ['0', 0],
    ['12.', 1200],
    ['-3.25', -325],
    ['\u22123.25', -325],
    ['99,999,999.99', 9_999_999_999],
  ])('reads %s', (text, cents) => {
    expect(parseMoney(text)).toBe(cents);
  });

  it('takes an empty field for no amount', () => {
    expect(parseMoney('  ')).toBeNull();
  });

  it.each(['abc', '1.234', '1,25', '12,50', '.', '$', '1e3', '100,000,000.00', '1 250', '--1'])(
    'cannot read %s',
    (text) => {
      expect(parseMoney(text)).toBeUndefined();
    },
  );
});
