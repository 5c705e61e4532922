import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { DateTextPipe } from './date-text.pipe';
import { DurationPipe } from './duration.pipe';
import { MoneyPipe } from './money.pipe';
import { SHOP_CURRENCY, SHOP_ZONE } from './shop-settings';

beforeEach(() => {
  TestBed.configureTestingModule({
    providers: [
      DateTextPipe,
      DurationPipe,
      MoneyPipe,
      { provide: SHOP_ZONE, useValue: signal('America/New_York') },
      { provide: SHOP_CURRENCY, useValue: signal('USD') },
    ],
  });
});

describe('money', () => {
  const money: MoneyPipe['transform'] = (...args) => TestBed.inject(MoneyPipe).transform(...args);

  it('writes cents exactly, whole for reading at a glance, bare for a table, and as a difference', () => {
    expect(money(125_049)).toBe('$1,250.49');
    expect(money(125_050, 'whole')).toBe('$1,251');
    expect(money(125_049, 'bare')).toBe('1,250.49');
    expect(money(10_800, 'difference')).toBe('+$108.00');
  });

  it('writes below zero with a true minus, and never a negative zero', () => {
    expect(money(-11_950, 'whole')).toBe('\u2212$120');
    expect(money(-40, 'whole')).toBe('$0');
  });

  it('writes nothing for what is not there', () => {
    expect(money(undefined)).toBe('');
  });
});

describe('dateText', () => {
  const dateText: DateTextPipe['transform'] = (...args) => TestBed.inject(DateTextPipe).transform(...args);
  beforeEach(() => jest.useFakeTimers({ now: new Date('2026-06-01T12:00:00Z') }));
  afterEach(() => jest.useRealTimers());

  it('writes a date without a zone as it stands', () => {
    expect(dateText('2026-01-15')).toBe('Thu, Jan 15');
    expect(dateText('2025-01-14')).toBe('Tue, Jan 14, 2025');
  });

  it('shows an instant on the day and at the time it has in the shop', () => {
    expect(dateText('2026-01-15T03:31:00Z')).toBe('Wed, Jan 14');
    expect(dateText('2026-01-15T03:31:00Z', 'day-and-time')).toBe('Wed, Jan 14, 10:31 pm');
    expect(dateText('2026-07-15T13:31:00Z', 'time')).toBe('9:31 am');
  });
});

describe('duration', () => {
  it('reads as a clock does, or as hours in a column', () => {
    const pipe = TestBed.inject(DurationPipe);
    expect(pipe.transform(134)).toBe('2 h 14 m');
    expect(pipe.transform(450, 'hours')).toBe('7.5 h');
    expect(pipe.transform(null)).toBe('');
  });
});
