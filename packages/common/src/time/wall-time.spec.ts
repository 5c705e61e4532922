import { instantOnWall, wallTime } from './wall-time.js';

const chicago = 'America/Chicago';

describe('a time on the wall', () => {
  it.each([
    ['2027-01-14', '09:31', '2027-01-14T15:31:00.000Z'],
    ['2027-07-14', '09:31', '2027-07-14T14:31:00.000Z'],
    // The hour that is skipped, and the first of the hour that comes twice.
    ['2027-03-14', '02:30', '2027-03-14T08:30:00.000Z'],
    ['2027-11-07', '01:30', '2027-11-07T06:30:00.000Z'],
  ])('%s %s is %s', (on, at, instant) => {
    expect(instantOnWall(chicago, on, at)).toBe(instant);
  });

  it('comes back as it was written', () => {
    expect(wallTime(chicago, '2027-01-14T15:31:00.000Z')).toBe('09:31');
  });

  it.each([
    ['', '09:31'],
    ['2027-01-14', ''],
    ['2027-02-30', '09:31'],
    ['2027-01-14', '25:00'],
  ])('is none on "%s" at "%s"', (on, at) => {
    expect(instantOnWall(chicago, on, at)).toBeNull();
  });
});
