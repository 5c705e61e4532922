import {
  boxes,
  buildClock,
  buildIn,
  buildOpenEntry,
  buildOut,
  buildRunning,
  BOXES,
  FRAMES,
} from '../testing/build-punch';
import { applyPunches, runningMinutes, workToday } from './apply-punches';
import { MEAL_BREAK } from './punch';

const zone = 'America/Chicago';
const at = (time: string) => `2027-01-12T${time}:00.000Z`;
const today = (
  server: ReturnType<typeof buildClock>,
  punches: Parameters<typeof applyPunches>[1],
  now: string,
) => workToday(server, applyPunches(server, punches), now, zone);

describe('the clock as the person knows it', () => {
  it('is what the server said while nothing waits', () => {
    const { running, closed } = applyPunches(buildClock({ open: buildOpenEntry() }), []);
    expect(running).toMatchObject({ entryId: FRAMES.entry, startedAt: at('15:31'), kept: false });
    expect(running?.work).toMatchObject({ jobNumber: 1042, operationName: 'Face frames' });
    expect(closed).toEqual([]);
  });

  it('runs from a punch that waits, to the minute it fell in', () => {
    expect(applyPunches(null, [buildIn()]).running).toMatchObject({ startedAt: at('15:31'), kept: true });
  });

  it('switches, breaks and stops by what waits, in its order', () => {
    const switched = buildIn({ order: 3, entryId: BOXES.entry, at: at('16:00'), work: boxes() });
    const pause = buildIn({ order: 4, entryId: 'pause', at: at('18:00'), work: MEAL_BREAK });
    const clock = applyPunches(buildClock({ open: buildOpenEntry() }), [switched, pause]);
    expect(clock.running?.work.kind).toBe('meal-break');
    expect(clock.closed.map(({ startedAt, endedAt }) => [startedAt, endedAt])).toEqual([
      [at('15:31'), at('16:00')],
      [at('16:00'), at('18:00')],
    ]);
    const out = buildOut({ order: 5, entryId: 'pause', at: at('18:30') });
    expect(applyPunches(buildClock(), [switched, pause, out]).running).toBeNull();
  });

  it('does not count a punch twice that the server took while its answer was lost', () => {
    const clock = applyPunches(buildClock({ open: buildOpenEntry() }), [buildIn()]);
    expect(clock).toMatchObject({ running: { entryId: FRAMES.entry, kept: false }, closed: [] });
  });

  it('leaves what runs alone when a waiting punch ends something else, or was refused', () => {
    const server = buildClock({ open: buildOpenEntry() });
    expect(applyPunches(server, [buildOut({ entryId: 'another' })]).running?.entryId).toBe(FRAMES.entry);
    expect(applyPunches(server, [buildOut({ refused: 'Longer than 16 hours.' })]).running).not.toBeNull();
  });
});

describe('work of today', () => {
  it('adds what waits and what runs to what the server has closed', () => {
    const server = buildClock({ todayMinutes: 90, open: buildOpenEntry() });
    const switched = buildIn({ order: 3, entryId: BOXES.entry, at: at('16:31'), work: boxes() });
    expect(today(server, [switched], at('16:46'))).toBe(90 + 60 + 15);
  });

  it('leaves meal breaks out', () => {
    const pause = buildIn({ entryId: 'pause', at: at('16:00'), work: MEAL_BREAK });
    expect(today(buildClock({ todayMinutes: 90 }), [pause], at('16:30'))).toBe(90);
  });

  it('counts only from midnight on the wall of the shop', () => {
    // Running since 11:30 pm in Chicago; it is 12:20 am.
    const open = buildOpenEntry({ startedAt: '2027-01-13T05:30:00.000Z' });
    expect(today(buildClock({ open }), [], '2027-01-13T06:20:00.000Z')).toBe(20);
  });

  it('is never below nothing when this device’s clock is behind', () => {
    const server = buildClock({ open: buildOpenEntry() });
    expect(today(server, [], at('15:20'))).toBe(0);
    expect(runningMinutes(buildRunning(), at('15:20'))).toBe(0);
  });
});
