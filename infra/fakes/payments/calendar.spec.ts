import { addMonths, nextPeriodEnd } from './calendar.js';

const at = (text: string): number => Date.parse(text) / 1000;

describe('months on the calendar', () => {
  it.each([
    ['2026-01-15T08:30:00Z', 1, '2026-02-15T08:30:00Z'],
    ['2026-01-31T08:30:00Z', 1, '2026-02-28T08:30:00Z'],
    ['2028-01-31T08:30:00Z', 1, '2028-02-29T08:30:00Z'],
    ['2026-12-31T23:59:59Z', 2, '2027-02-28T23:59:59Z'],
    ['2026-03-31T00:00:00Z', 12, '2027-03-31T00:00:00Z'],
  ])('%s and %d months is %s', (from, months, to) => {
    expect(addMonths(at(from), months)).toBe(at(to));
  });

  it('keeps the day of the anchor after a shorter month', () => {
    const anchor = at('2026-01-31T00:00:00Z');
    const first = nextPeriodEnd(anchor, anchor, 1);
    expect(first).toBe(at('2026-02-28T00:00:00Z'));
    expect(nextPeriodEnd(anchor, first, 1)).toBe(at('2026-03-31T00:00:00Z'));
  });
});
