import fc from 'fast-check';
import {
  overlaps,
  refuseClockIn,
  refuseClockOut,
  refuseOverlap,
  refuseTimes,
  type Span,
} from './clock-rules.js';

const now = '2027-01-14T18:00:00.000Z';
const span = (startedAt: string, endedAt: string | null): Span => ({
  startedAt: `2027-01-14T${startedAt}:00.000Z`,
  endedAt: endedAt && `2027-01-14T${endedAt}:00.000Z`,
});

describe('times of an entry', () => {
  it.each<[string, Span, RegExp]>([
    ['an end before the start', span('15:00', '14:59'), /before it starts/],
    ['a start in the future', span('18:06', null), /starts in the future/],
    ['an end in the future', span('17:00', '18:06'), /ends in the future/],
    [
      'more than 16 hours',
      { startedAt: '2027-01-14T01:00:00.000Z', endedAt: '2027-01-14T17:01:00.000Z' },
      /16 hours/,
    ],
  ])('are refused with %s', (_, times, sentence) => {
    expect(refuseTimes(times, now)?.detail).toMatch(sentence);
  });

  it.each<[string, Span]>([
    ['ending the minute it starts', span('15:00', '15:00')],
    ['from a clock that runs five minutes ahead', span('17:00', '18:05')],
    ['of exactly 16 hours', { startedAt: '2027-01-14T01:00:00.000Z', endedAt: '2027-01-14T17:00:00.000Z' }],
    ['still open', span('17:00', null)],
  ])('are taken %s', (_, times) => {
    expect(refuseTimes(times, now)).toBeNull();
  });
});

describe('two entries of a member', () => {
  it('may touch', () => {
    expect(refuseOverlap(span('10:00', '12:00'), [span('08:00', '10:00'), span('12:00', null)])).toBeNull();
  });

  it.each([
    [span('09:59', '12:00'), span('08:00', '10:00')],
    [span('08:00', '12:00'), span('09:00', '10:00')],
    [span('13:00', '14:00'), span('12:00', null)],
    [span('08:00', '10:00'), span('08:00', '10:00')],
    [span('09:00', '09:00'), span('08:00', '10:00')],
  ])('may not overlap', (one, other) => {
    expect(refuseOverlap(one, [other])?.detail).toMatch(/overlaps/);
    expect(overlaps(other, one)).toBe(true);
  });

  it('overlap in either order or in neither', () => {
    const any = fc.tuple(fc.nat(1000), fc.option(fc.nat(500))).map(([start, length]) => ({
      startedAt: new Date(start * 60_000).toISOString(),
      endedAt: length === null ? null : new Date((start + length) * 60_000).toISOString(),
    }));
    fc.assert(fc.property(any, any, (a, b) => expect(overlaps(a, b)).toBe(overlaps(b, a))));
  });
});

describe('the clock', () => {
  const at = (time: string) => `2027-01-14T${time}:00.000Z`;

  it('clocks in, also with a punch that was kept for a while', () => {
    expect(refuseClockIn(at('13:00'), now, null, [span('08:00', '12:00')])).toBeNull();
  });

  it('refuses a punch into time that is entered already', () => {
    expect(refuseClockIn(at('11:00'), now, null, [span('08:00', '12:00')])?.fields).toEqual([
      { path: 'at', message: 'This overlaps with other time of the same member.' },
    ]);
  });

  it('switches where the open entry can close, and not before it started', () => {
    expect(refuseClockIn(at('13:00'), now, span('12:00', null), [])).toBeNull();
    expect(refuseClockIn(at('11:00'), now, span('12:00', null), [])?.detail).toMatch(/before it starts/);
  });

  it('refuses to close an entry over time that was entered in its course', () => {
    const meanwhile = [span('13:00', '14:00')];
    expect(refuseClockOut(at('14:30'), now, span('12:00', null), meanwhile)?.detail).toMatch(/overlaps/);
    expect(refuseClockIn(at('14:30'), now, span('12:00', null), meanwhile)?.detail).toMatch(/overlaps/);
    expect(refuseClockOut(at('13:00'), now, span('12:00', null), meanwhile)).toBeNull();
  });

  it('asks for the true end of an entry that was forgotten', () => {
    const forgotten = { startedAt: '2027-01-13T22:00:00.000Z', endedAt: null };
    expect(refuseClockOut(now, now, forgotten)?.detail).toMatch(/really stopped/);
    expect(refuseClockOut('2027-01-14T01:00:00.000Z', now, forgotten)).toBeNull();
  });
});
