import { addDays, dateIn, daysBetween, daysOfWeek, startOfDay, weekStart } from './shop-dates.js';
import { formatDate, formatDuration, formatHours, formatInstant, formatTime } from './format.js';
import { isTimeZone } from './time-zone.js';

const chicago = 'America/Chicago';

describe('dates on the wall of the shop', () => {
  it('are those of its zone, not of UTC', () => {
    expect(dateIn(chicago, '2027-01-15T03:30:00.000Z')).toBe('2027-01-14');
    expect(dateIn('Pacific/Auckland', '2027-01-14T12:00:00.000Z')).toBe('2027-01-15');
  });

  // The United States change their clocks on March 14 and November 7 in 2027 (15 U.S.C. 260a).
  it.each([
    ['2027-03-13', '2027-03-13T06:00:00.000Z'],
    ['2027-03-15', '2027-03-15T05:00:00.000Z'],
    ['2027-11-08', '2027-11-08T06:00:00.000Z'],
  ])('%s begins at %s', (date, instant) => {
    expect(startOfDay(chicago, date)).toBe(instant);
  });

  it('begin after midnight where midnight is skipped', () => {
    // Chile moved its clocks from 0:00 to 1:00 on September 5, 2021 (IANA time zone database).
    expect(startOfDay('America/Santiago', '2021-09-05')).toBe('2021-09-05T04:00:00.000Z');
  });

  it('add and subtract as calendars do', () => {
    expect(addDays('2028-02-28', 1)).toBe('2028-02-29');
    expect(addDays('2027-01-01', -1)).toBe('2026-12-31');
    expect(daysBetween('2027-03-13', '2027-03-15')).toBe(2);
    expect(daysBetween('2027-03-15', '2027-03-13')).toBe(-2);
  });

  it('lie in a workweek that begins on Monday', () => {
    expect(['2027-01-11', '2027-01-14', '2027-01-17'].map(weekStart)).toEqual(Array(3).fill('2027-01-11'));
    expect(daysOfWeek('2027-01-11').at(-1)).toBe('2027-01-17');
  });

  it('refuse what is no date and no zone', () => {
    expect(() => addDays('2027-02-30', 1)).toThrow(RangeError);
    expect(() => dateIn('Mars/Olympus', '2027-01-01T00:00:00Z')).toThrow(RangeError);
  });
});

describe('how dates and times read', () => {
  it('are short in the current year and have the year otherwise', () => {
    expect(formatDate('2027-01-14', '2027-03-01')).toBe('Thu, Jan 14');
    expect(formatDate('2027-01-14', '2026-12-30')).toBe('Thu, Jan 14, 2027');
    expect(formatDate('2027-01-14')).toBe('Thu, Jan 14, 2027');
  });

  it('are in the shop’s zone', () => {
    expect(formatTime('2027-01-14T15:31:00Z', chicago)).toBe('9:31 am');
    expect(formatTime('2027-07-14T17:05:00Z', chicago)).toBe('12:05 pm');
    expect(formatInstant('2027-01-15T03:30:00Z', chicago, '2027-01-15')).toBe('Thu, Jan 14, 9:30 pm');
  });

  it.each([
    [134, '2 h 14 m'],
    [45, '45 m'],
    [180, '3 h'],
    [0, '0 m'],
    [-75, '\u22121 h 15 m'],
  ])('%i minutes are %s', (minutes, text) => {
    expect(formatDuration(minutes)).toBe(text);
  });

  it.each([
    [450, '7.5 h'],
    [282, '4.7 h'],
    [3, '0.1 h'],
    [-2, '0.0 h'],
    [-144, '\u22122.4 h'],
  ])('%i minutes are %s in a table', (minutes, text) => {
    expect(formatHours(minutes)).toBe(text);
  });
});

describe('a time zone', () => {
  it.each(['America/Chicago', 'UTC', 'America/Argentina/Buenos_Aires', 'Etc/GMT+5'])('can be %s', (zone) => {
    expect(isTimeZone(zone)).toBe(true);
  });
  it.each(['', '+05:00', 'Mars/Olympus', 'America/', "America/Chicago'"])('cannot be %j', (zone) => {
    expect(isTimeZone(zone)).toBe(false);
  });
});
