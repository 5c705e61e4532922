import {
  boxes,
  boxesChoice,
  buildClock,
  buildIn,
  buildJobs,
  buildOpenEntry,
  buildOut,
  BOXES,
  FRAMES,
} from '../testing/build-punch';
import { ClockApi, ClockPage, PunchQueue } from './clock.actions';
import { clockFeature, initialClock, type ClockSlice } from './clock.state';

type Action = Parameters<typeof clockFeature.reducer>[1];
const run = (...actions: Action[]): ClockSlice => actions.reduce(clockFeature.reducer, initialClock);
const problem = { type: '', title: '', status: 0, code: 'no-connection', detail: 'No connection.' };
const loaded = ClockApi.loaded({ clock: buildClock({ open: buildOpenEntry() }) });
const switched = buildIn({ order: 3, entryId: BOXES.entry, work: boxes(), at: '2027-01-12T16:00:00.000Z' });

describe('the clock', () => {
  it('shows a punch at once, before it is sent', () => {
    const state = { clock: run(loaded, ClockPage.punched({ punch: switched })) };
    expect(clockFeature.selectRunning(state)).toMatchObject({ entryId: BOXES.entry, kept: true });
  });

  it('shows what the server made of it once it was taken', () => {
    const open = buildOpenEntry({ id: BOXES.entry, startedAt: '2027-01-12T16:00:00.000Z' });
    const taken = ClockApi.punchTaken({ answer: { entry: open, clock: buildClock({ open }) }, punches: [] });
    const state = { clock: run(loaded, ClockPage.punched({ punch: switched }), taken) };
    expect(clockFeature.selectRunning(state)).toMatchObject({ entryId: BOXES.entry, kept: false });
    expect(state.clock.punches).toEqual([]);
  });

  it('keeps what it knows when it cannot ask', () => {
    const state = { clock: run(loaded, ClockApi.loadFailed({ problem })) };
    expect(clockFeature.selectRunning(state)?.entryId).toBe(FRAMES.entry);
    expect(clockFeature.selectChoices(state)).toContainEqual(boxesChoice());
    expect(state.clock.problem).toEqual(problem);
  });

  it('says why punches wait for as long as they do', () => {
    const waiting = run(PunchQueue.changed({ punches: [switched] }), PunchQueue.waits({ why: 'no-network' }));
    expect(waiting.waiting).toBe('no-network');
    const next = (punches: ClockSlice['punches']) =>
      clockFeature.reducer(waiting, PunchQueue.changed({ punches })).waiting;
    expect(next([switched, buildOut()])).toBe('no-network');
    expect(next([{ ...switched, refused: 'This job is closed.' }])).toBeNull();
    expect(next([])).toBeNull();
  });

  it('tries what waits again, but nothing behind a refused punch', () => {
    const trying = (punches: ClockSlice['punches']) =>
      clockFeature.selectTrying({ clock: run(PunchQueue.changed({ punches })) });
    const refused = { ...switched, refused: 'This job is closed.' };
    expect([trying([]), trying([switched]), trying([refused, buildOut()])]).toEqual([false, true, false]);
    const state = { clock: run(PunchQueue.changed({ punches: [refused, buildOut()] })) };
    expect(clockFeature.selectRefused(state)).toEqual(refused);
  });

  it('holds every job for the time without a network', () => {
    expect(run(ClockApi.jobsLoaded({ jobs: buildJobs() })).jobs?.jobs).toHaveLength(2);
  });
});
