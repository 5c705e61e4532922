import { agingBars } from './aging-bars';

const nothing = {
  currentCents: 0,
  days1To30Cents: 0,
  days31To60Cents: 0,
  days61To90Cents: 0,
  over90Cents: 0,
  totalCents: 0,
};

describe('agingBars', () => {
  it('shares the width by what is owed, and tells what is late', () => {
    const bars = agingBars({ ...nothing, currentCents: 7500, over90Cents: 2500, totalCents: 10_000 });
    expect(bars.map(({ percent, late }) => [percent, late])).toEqual([
      [75, false],
      [0, true],
      [0, true],
      [0, true],
      [25, true],
    ]);
  });

  it('keeps a small debt visible, and draws nothing where nothing is owed', () => {
    const [current, month] = agingBars({
      ...nothing,
      currentCents: 999_900,
      days1To30Cents: 100,
      totalCents: 1_000_000,
    });
    expect(month?.percent).toBeGreaterThan(1);
    expect(current?.percent).toBeCloseTo(99.99);
    expect(agingBars(nothing).every(({ percent }) => percent === 0)).toBe(true);
  });
});
