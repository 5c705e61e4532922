import fc from 'fast-check';
import { addDays, dateIn, weekStart } from '../calendar/shop-dates.js';
import { laborCost } from './labor-cost.js';
import { elapsedMinutes, punchMinute } from './punch.js';
import { splitByDay, weekBounds, weekDays, weekTotals } from './shop-week.js';

const chicago = 'America/Chicago';
const work = (startedAt: string, endedAt: string) => ({ kind: 'work' as const, startedAt, endedAt });

describe('a shift across midnight', () => {
  it('counts in both days, each its part', () => {
    // 10 pm to 2 am in Chicago.
    expect(splitByDay('2027-01-15T04:00:00.000Z', '2027-01-15T08:00:00.000Z', chicago)).toEqual([
      { on: '2027-01-14', minutes: 120 },
      { on: '2027-01-15', minutes: 120 },
    ]);
  });

  it('that ends at midnight leaves nothing in the next day', () => {
    expect(splitByDay('2027-01-15T04:00:00.000Z', '2027-01-15T06:00:00.000Z', chicago)).toEqual([
      { on: '2027-01-14', minutes: 120 },
    ]);
  });

  it('is an hour shorter than the wall says in the night the clocks go forward', () => {
    // 11 pm on March 13 to 7 am on March 14, 2027: seven hours of work.
    expect(splitByDay('2027-03-14T05:00:00.000Z', '2027-03-14T12:00:00.000Z', chicago)).toEqual([
      { on: '2027-03-13', minutes: 60 },
      { on: '2027-03-14', minutes: 360 },
    ]);
  });

  it('is an hour longer than the wall says in the night the clocks go back', () => {
    // 11 pm on November 6 to 7 am on November 7, 2027: nine hours of work.
    expect(splitByDay('2027-11-07T04:00:00.000Z', '2027-11-07T13:00:00.000Z', chicago)).toEqual([
      { on: '2027-11-06', minutes: 60 },
      { on: '2027-11-07', minutes: 480 },
    ]);
  });
});

describe('a workweek', () => {
  it.each([
    ['2027-01-11', 168],
    ['2027-03-08', 167],
    ['2027-11-01', 169],
  ])('from %s is %i hours long', (startsOn, hours) => {
    const { from, to } = weekBounds(startsOn, chicago);
    expect(elapsedMinutes(from, to)).toBe(hours * 60);
  });

  it('adds work and meal breaks up apart', () => {
    const days = weekDays(
      [
        work('2027-01-11T13:00:00.000Z', '2027-01-11T18:00:00.000Z'),
        { kind: 'meal-break', startedAt: '2027-01-11T18:00:00.000Z', endedAt: '2027-01-11T18:30:00.000Z' },
        work('2027-01-11T18:30:00.000Z', '2027-01-11T22:00:00.000Z'),
      ],
      '2027-01-11',
      chicago,
    );
    expect(days[0]).toEqual({ on: '2027-01-11', workMinutes: 510, mealBreakMinutes: 30 });
    expect(weekTotals(days)).toEqual({ workMinutes: 510, mealBreakMinutes: 30 });
  });

  it('takes only its own part of a shift that runs in from the week before', () => {
    // Sunday 10 pm to Monday 2 am.
    const shift = work('2027-01-11T04:00:00.000Z', '2027-01-11T08:00:00.000Z');
    expect(weekTotals(weekDays([shift], '2027-01-11', chicago)).workMinutes).toBe(120);
    expect(weekTotals(weekDays([shift], '2027-01-04', chicago)).workMinutes).toBe(120);
  });

  const zone = fc.constantFrom(
    chicago,
    'America/St_Johns',
    'Australia/Lord_Howe',
    'Asia/Kathmandu',
    'America/Santiago',
    'UTC',
  );
  const second = fc.integer({ min: Date.parse('2015-01-01') / 1000, max: Date.parse('2035-01-01') / 1000 });

  it('loses no minute: the weeks a shift touches hold all of it, to the second it starts on', () => {
    fc.assert(
      fc.property(zone, second, fc.integer({ min: 0, max: 16 * 3600 }), (where, start, seconds) => {
        const shift = work(
          new Date(start * 1000).toISOString(),
          new Date((start + seconds) * 1000).toISOString(),
        );
        const first = weekStart(dateIn(where, shift.startedAt));
        const total = [first, addDays(first, 7)]
          .map((startsOn) => weekTotals(weekDays([shift], startsOn, where)).workMinutes)
          .reduce((sum, minutes) => sum + minutes, 0);
        expect(total).toBe(Math.floor(seconds / 60));
      }),
    );
  });

  it('has a part of at least nothing in each day, and the days follow one another', () => {
    fc.assert(
      fc.property(zone, second, fc.integer({ min: 0, max: 60 * 3600 }), (where, start, seconds) => {
        const from = new Date(start * 1000).toISOString();
        const parts = splitByDay(from, new Date((start + seconds) * 1000).toISOString(), where);
        parts.forEach((part, index) => {
          expect(part.minutes).toBeGreaterThanOrEqual(0);
          expect(part.on).toBe(addDays(parts[0]!.on, index));
        });
      }),
    );
  });
});

describe('a punch', () => {
  it('is kept to the minute it falls in', () => {
    expect(punchMinute('2027-01-14T15:31:59.999Z')).toBe('2027-01-14T15:31:00.000Z');
  });

  it('favors nobody when shifts start and end at any second (29 CFR 785.48(b))', () => {
    const seconds = Array.from({ length: 60 }, (_, index) => index);
    const gained = seconds.flatMap((start) =>
      seconds.map((end) => {
        const from = new Date(Date.UTC(2027, 0, 14, 8, 0, start)).toISOString();
        const to = new Date(Date.UTC(2027, 0, 14, 16, 0, end)).toISOString();
        return (
          elapsedMinutes(punchMinute(from), punchMinute(to)) * 60 - (Date.parse(to) - Date.parse(from)) / 1000
        );
      }),
    );
    expect(gained.reduce((sum, seconds) => sum + seconds, 0)).toBe(0);
  });

  // 29 CFR 778.110(a): $12.00 an hour, here 46 hours at straight time.
  it('costs its minutes at the hour’s cost', () => {
    expect(laborCost(46 * 60, 1_200)).toBe(55_200);
    expect(laborCost(1, 3_350)).toBe(56);
  });
});
