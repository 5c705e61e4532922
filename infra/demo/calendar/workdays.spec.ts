import { Workdays } from './workdays.js';

describe('working days', () => {
  it('are counted back from today', () => {
    const days = new Workdays('2026-06-17');
    expect([0, -1, -2, -3].map((index) => days.dateOf(index))).toEqual([
      '2026-06-17',
      '2026-06-16',
      '2026-06-15',
      '2026-06-12',
    ]);
  });

  it('begin with Friday on a Sunday', () => {
    expect(new Workdays('2026-06-21').dateOf(0)).toBe('2026-06-19');
  });

  it('go on after today', () => {
    const days = new Workdays('2026-06-19');
    expect([1, 2].map((index) => days.dateOf(index))).toEqual(['2026-06-22', '2026-06-23']);
  });

  it('leave out the fourth Thursday of November and the Friday after it, and the days about Christmas', () => {
    const days = new Workdays('2026-12-28');
    expect([-1, -2].map((index) => days.dateOf(index))).toEqual(['2026-12-23', '2026-12-22']);
    expect(new Workdays('2026-11-30').dateOf(-1)).toBe('2026-11-25');
    // The fifth Thursday is one like any other.
    expect(new Workdays('2023-11-30').dateOf(0)).toBe('2023-11-30');
  });

  it('know where a night lies between two of them, and where a weekend', () => {
    const days = new Workdays('2026-06-17');
    expect(days.isFollowedByWork(-1)).toBe(true);
    expect(days.isFollowedByWork(-3)).toBe(false);
    expect(days.isFollowedByWork(0)).toBe(false);
  });
});
