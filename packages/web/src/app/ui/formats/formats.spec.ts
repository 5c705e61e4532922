import { dateText } from './date-text';
import { durationText, hoursText } from './duration-text';
import { moneyText } from './money-text';

const NOW = new Date('2026-06-01T12:00:00Z');

describe('moneyText', () => {
  it('writes cents exactly, whole for reading at a glance, or bare for a table', () => {
    expect(moneyText(125_000)).toBe('$1,250.00');
    expect(moneyText(125_049, 'whole')).toBe('$1,250');
    expect(moneyText(125_000, 'bare')).toBe('1,250.00');
  });

  it('puts a true minus before the currency', () => {
    expect(moneyText(-11_900)).toBe('\u2212$119.00');
  });

  it('signs a difference, and nothing when there is none', () => {
    expect(moneyText(10_800, 'signed-whole')).toBe('+$108');
    expect(moneyText(-10_800, 'signed')).toBe('\u2212$108.00');
    expect(moneyText(0, 'signed')).toBe('$0.00');
  });
});

describe('dateText', () => {
  it('writes a date without a zone as it stands', () => {
    expect(dateText('2026-01-15', 'America/Los_Angeles', 'day', NOW)).toBe('Thu, Jan 15');
  });

  it('names the year when it is not the present one', () => {
    expect(dateText('2025-01-14', 'UTC', 'day', NOW)).toBe('Tue, Jan 14, 2025');
  });

  it('shows an instant on the day and at the time it has in the zone', () => {
    expect(dateText('2026-01-15T03:31:00Z', 'America/New_York', 'day-and-time', NOW)).toBe(
      'Wed, Jan 14, 10:31 pm',
    );
    expect(dateText('2026-07-15T13:31:00Z', 'America/New_York', 'time', NOW)).toBe('9:31 am');
  });
});

describe('durationText', () => {
  it('reads as a clock does', () => {
    expect(durationText(134)).toBe('2 h 14 m');
    expect(durationText(120)).toBe('2 h');
    expect(durationText(9)).toBe('9 m');
    expect(durationText(0)).toBe('0 m');
    expect(durationText(-75)).toBe('\u22121 h 15 m');
  });

  it('reads as hours in a column', () => {
    expect(hoursText(450)).toBe('7.5 h');
    expect(hoursText(-90)).toBe('\u22121.5 h');
  });
});
