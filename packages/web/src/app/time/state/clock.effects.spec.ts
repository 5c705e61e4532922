import { Actions } from '@ngrx/effects';
import type { Action, Store } from '@ngrx/store';
import { BehaviorSubject, firstValueFrom, of, Subject, throwError, toArray } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { PunchSender, Sent } from '../punches/punch-sender';
import { memoryPunchBox } from '../punches/punch-box';
import type { PunchStore } from '../punches/punch-store';
import type { KeptPunch } from '../punches/punch';
import {
  boxes,
  buildClock,
  buildIn,
  buildJobs,
  buildOpenEntry,
  buildOut,
  BOXES,
} from '../testing/build-punch';
import type { TimeApiClient } from '../time-api';
import { ClockApi, ClockPage, PunchQueue } from './clock.actions';
import * as effects from './clock.effects';

const problem = { type: '', title: '', status: 0, code: 'no-connection', detail: 'No connection.' };
const clock = buildClock();
const answer = { entry: buildOpenEntry(), clock };
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<TimeApiClient>) => methods as TimeApiClient;
const all = <Out>(stream: { pipe: Actions<Action>['pipe'] }) =>
  firstValueFrom((stream as Actions<Action>).pipe(toArray())) as unknown as Promise<Out[]>;

function store(punches: KeptPunch[] = [], elsewhere$ = new Subject<void>()) {
  const box = memoryPunchBox();
  const filled = box.change('me', () => punches);
  return {
    elsewhere$,
    read: () => filled.then(() => box.read('me')),
    value: {
      read: () => filled.then(() => box.read('me')),
      change: (to: Parameters<PunchStore['change']>[0]) => filled.then(() => box.change('me', to)),
      changedElsewhere$: elsewhere$.asObservable(),
    } as unknown as PunchStore,
  };
}

describe('the clock’s effects', () => {
  it('read the clock when it is opened, and again when the page is looked at', async () => {
    const read = jest.fn(() => of(clock));
    const opened = actions(ClockPage.opened(), ClockPage.woken());
    expect(await all(effects.loadClock(opened, api({ clock: read })))).toContainEqual(
      ClockApi.loaded({ clock }),
    );
    expect(read).toHaveBeenCalledTimes(2);
  });

  it('drop an answer that is older than what a punch was answered', () => {
    const stream = new Subject<Action>();
    const slow = new Subject<typeof clock>();
    const seen: Action[] = [];
    effects
      .loadClock(new Actions(stream), api({ clock: () => slow }))
      .subscribe((action) => seen.push(action));
    stream.next(ClockPage.opened());
    stream.next(ClockApi.punchTaken({ answer, punches: [] }));
    slow.next(clock);
    expect(seen).toEqual([]);
  });

  it('say why nothing could be read', async () => {
    const failing = api({ clock: () => throwError(() => new ApiProblem(problem)) });
    expect(await all(effects.loadClock(actions(ClockPage.opened()), failing))).toEqual([
      ClockApi.loadFailed({ problem }),
    ]);
  });

  it('load every job with the screen', async () => {
    const jobs = buildJobs();
    const loaded = effects.loadJobs(actions(ClockPage.jobsWanted()), api({ clockJobs: () => of(jobs) }));
    expect(await all(loaded)).toEqual([ClockApi.jobsLoaded({ jobs })]);
  });

  it('write punches down in their order', async () => {
    const [first, second] = [buildIn({ order: 1 }), buildOut({ order: 2 })];
    const { value, read } = store();
    const kept = actions(ClockPage.punched({ punch: first }), ClockPage.punched({ punch: second }));
    expect(await all(effects.keep(kept, value))).toEqual([
      PunchQueue.changed({ punches: [first] }),
      PunchQueue.changed({ punches: [first, second] }),
    ]);
    expect(await read()).toEqual([first, second]);
  });

  it('read what waits at the start, and again when another tab changed it', async () => {
    const { value, elsewhere$ } = store([buildIn()]);
    const seen: Action[] = [];
    effects.readQueue(actions(ClockPage.opened()), value).subscribe((action) => seen.push(action));
    elsewhere$.next();
    await new Promise((resolve) => setTimeout(resolve));
    expect(seen).toEqual([
      PunchQueue.changed({ punches: [buildIn()] }),
      PunchQueue.changed({ punches: [buildIn()] }),
    ]);
  });

  it.each([
    ['puts it on something else', ClockPage.refusedPutOn({ order: 1, work: boxes() }), 'Assemble boxes'],
    [
      'gives another time',
      ClockPage.refusedMoved({ order: 1, at: '2027-01-12T14:00:00.000Z' }),
      'Face frames',
    ],
  ])('send a refused punch again once the person %s', async (_, action, operationName) => {
    const { value } = store([buildIn({ refused: 'This job is closed.' })]);
    const [changed] = await all<ReturnType<typeof PunchQueue.changed>>(
      effects.settle(actions(action), value),
    );
    expect(changed?.punches).toMatchObject([{ refused: null, work: { operationName } }]);
  });

  it('forget a punch only when the person lets it go', async () => {
    const { value } = store([buildIn({ refused: 'This job is closed.' })]);
    const gone = effects.settle(actions(ClockPage.refusedLetGo({ order: 1 })), value);
    expect(await all(gone)).toEqual([PunchQueue.changed({ punches: [] })]);
  });

  describe('sending', () => {
    const sender = (sent: Sent) => {
      const next = jest.fn(() => Promise.resolve(sent));
      return { next, value: { next } as unknown as PunchSender };
    };
    const changed = PunchQueue.changed({ punches: [buildIn()] });

    it('tells what the server made of a punch', async () => {
      const { value } = sender({ type: 'taken', answer, punches: [] });
      expect(await all(effects.send(actions(changed), value))).toEqual([
        ClockApi.punchTaken({ answer, punches: [] }),
      ]);
    });

    it('goes on with the next after each, and stops when nothing is left', async () => {
      const { value, next } = sender({ type: 'nothing' });
      const left = ClockApi.punchTaken({ answer, punches: [buildIn({ entryId: BOXES.entry })] });
      const none = ClockApi.punchTaken({ answer, punches: [] });
      await all(effects.send(actions(changed, left, none, PunchQueue.changed({ punches: [] })), value));
      expect(next).toHaveBeenCalledTimes(2);
    });

    it('shows a refused punch and reads the clock it was about', async () => {
      const punches = [buildIn({ refused: 'This job is closed.' })];
      const { value } = sender({ type: 'refused', punches });
      expect(await all(effects.send(actions(changed), value))).toEqual([
        PunchQueue.changed({ punches }),
        ClockPage.woken(),
      ]);
    });

    it('says why it has to wait, and renews the session only when asked', async () => {
      const { value, next } = sender({ type: 'waits', why: 'signed-out' });
      const waits = await all(effects.send(actions(PunchQueue.retryDue(), ClockPage.sendPressed()), value));
      expect(waits).toContainEqual(PunchQueue.waits({ why: 'signed-out' }));
      expect(next.mock.calls).toEqual([[false], [true]]);
    });
  });

  it('try again from time to time while something waits', () => {
    jest.useFakeTimers();
    const trying$ = new BehaviorSubject(true);
    const seen: Action[] = [];
    const stream = effects
      .retry({ select: () => trying$ } as unknown as Store)
      .subscribe((action) => seen.push(action));
    jest.advanceTimersByTime(41_000);
    expect(seen).toHaveLength(2);
    trying$.next(false);
    jest.advanceTimersByTime(60_000);
    expect(seen).toHaveLength(2);
    stream.unsubscribe();
    jest.useRealTimers();
  });

  it('try again as soon as the network is back or the phone is looked at', () => {
    const seen: string[] = [];
    const stream = effects.wake(document).subscribe(({ type }) => seen.push(type));
    window.dispatchEvent(new Event('online'));
    document.dispatchEvent(new Event('visibilitychange'));
    expect(seen).toEqual([
      ...[PunchQueue.retryDue.type, ClockPage.woken.type],
      ...[PunchQueue.retryDue.type, ClockPage.woken.type],
    ]);
    stream.unsubscribe();
  });
});
