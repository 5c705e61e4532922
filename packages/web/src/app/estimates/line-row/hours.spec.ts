import { hoursToMinutes, minutesToHours } from './hours';

describe('hours of a line', () => {
  it('are kept as exact minutes', () => {
    expect(['1.5', '.25', '0', '12', '0.333', '7.75'].map(hoursToMinutes)).toEqual([
      '90',
      '15',
      '0',
      '720',
      '19.98',
      '465',
    ]);
  });

  it('come back as they were typed', () => {
    for (const hours of ['1.5', '0.25', '12', '0.333', '7.75', '0.1'])
      expect(minutesToHours(hoursToMinutes(hours) ?? '')).toBe(hours);
  });

  it('are refused when they are no number', () => {
    expect(['', 'x', '1h', '-1', '1.23456', '.'].map(hoursToMinutes)).toEqual([
      null,
      null,
      null,
      null,
      null,
      null,
    ]);
  });
});
