import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import type { ClockState } from '@bookmatch/common/time/clock-contract';
import { buildMembership } from '../../../testing/session';
import { openShopScreen } from '../../../testing/shop-screen';
import timeRoutes from '../../time.routes';
import { shopZone } from '../../testing/shop-zone';
import { boxes, buildClock, buildJobs, buildOpenEntry, FRAMES } from '../../testing/build-punch';

/** And half a minute, so that a slow test does not tip into the next. */
const minutesAgo = (minutes: number) => new Date(Date.now() - minutes * 60_000 - 30_000).toISOString();
const running = (overrides: Partial<ClockState> = {}) =>
  buildClock({ open: buildOpenEntry({ startedAt: minutesAgo(134) }), ...overrides });

async function open(clock: ClockState | null, url = '/time/clock') {
  const membership = buildMembership({ role: 'crew' });
  const screen = await openShopScreen([{ path: 'time', children: timeRoutes }], url, membership, [shopZone]);
  const { fixture, http, shop, element } = screen;
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  /** Lets the device write, and everything that follows from it. */
  const settle = async () => {
    for (let round = 0; round < 4; round += 1) {
      await new Promise((resolve) => setTimeout(resolve));
      await fixture.whenStable();
    }
  };
  const answer = (path: string, body: object, options?: { status: number; statusText: string }) =>
    http.expectOne(shop(path)).flush(body, options);
  if (clock) answer('/time/clock', clock);
  answer('/time/clock/jobs', buildJobs());
  await settle();
  const text = () => element.textContent?.replace(/\s+/g, ' ') ?? '';
  const button = (words: string | RegExp) =>
    [...element.querySelectorAll('button')].find(({ textContent }) =>
      (textContent ?? '').replace(/\s+/g, ' ').match(words),
    );
  const press = async (words: string | RegExp) => {
    button(words)!.click();
    await settle();
  };
  return { ...screen, loader, settle, answer, text, button, press };
}

const offline = { status: 0, statusText: 'Unknown Error' };
const conflict = (detail: string) => ({ type: '', title: '', status: 409, code: 'conflict', detail });

describe('PhoneClock', () => {
  afterEach(() => document.body.replaceChildren());

  it('shows what runs, for how long, and since when', async () => {
    const { text } = await open(running({ todayMinutes: 60 }));
    expect(text()).toContain('Job 1042, Mudroom lockers');
    expect(text()).toContain('2:14');
    expect(text()).toContain('3 h 14 m today');
  });

  it('offers what was done last when nothing runs', async () => {
    const { text, button } = await open(buildClock());
    expect(text()).toContain('Not clocked in');
    expect(button('Start Face frames')).toBeDefined();
    expect(button('Take a meal break')).toBeUndefined();
  });

  it('clocks out, and shows what the server made of it', async () => {
    const { press, http, shop, text, settle } = await open(running());
    await press(/^ ?Clock out/);
    expect(text()).toContain('Not clocked in');
    const request = http.expectOne(shop(`/time/entries/${FRAMES.entry}/clock-out`));
    expect(Date.parse((request.request.body as { at: string }).at)).toBeGreaterThan(Date.now() - 60_000);
    const closed = buildOpenEntry({ endedAt: minutesAgo(0), minutes: 134 });
    request.flush({ entry: closed, clock: buildClock({ todayMinutes: 134 }) });
    await settle();
    expect(text()).toContain('2 h 14 m today');
    expect(text()).not.toContain('kept');
  });

  it('switches with one touch and leaves what runs out of the list', async () => {
    const { press, http, shop, button, text } = await open(running());
    expect(button(/^ ?Face frames/)).toBeUndefined();
    await press(/^ ?Assemble boxes/);
    const { body } = http.expectOne(shop('/time/clock-in')).request;
    expect(body).toMatchObject({ jobId: boxes().jobId, operationId: boxes().operationId, kind: 'work' });
    expect(text()).toContain('0:00');
  });

  it('keeps punches without a network, says how many, and sends them in order when it is back', async () => {
    const { press, http, shop, text, settle } = await open(running());
    await press(/^ ?Assemble boxes/);
    http.expectOne(shop('/time/clock-in')).flush(null, offline);
    await settle();
    expect(text()).toContain('No network. 1 punch is kept');
    await press('Take a meal break');
    http.expectOne(shop('/time/clock-in')).flush(null, offline);
    await settle();
    expect(text()).toContain('2 punches are kept');
    expect(text()).toContain('Meal break');

    window.dispatchEvent(new Event('online'));
    await settle();
    http.match(shop('/time/clock')).forEach((request) => request.flush(running()));
    for (const kind of ['work', 'meal-break']) {
      const request = http.expectOne(shop('/time/clock-in'));
      expect(request.request.body).toMatchObject({ kind });
      request.flush({ entry: buildOpenEntry(), clock: running() });
      await settle();
    }
    http.expectNone(shop('/time/clock-in'));
    expect(text()).not.toContain('kept');
  });

  it('shows a punch that was refused with the reason, and puts it on something else', async () => {
    const { press, http, shop, text, settle, loader } = await open(running());
    await press(/^ ?Assemble boxes/);
    const first = http.expectOne(shop('/time/clock-in'));
    first.flush(conflict('This job is closed.'), { status: 409, statusText: 'Conflict' });
    await settle();
    http.expectOne(shop('/time/clock')).flush(running());
    await settle();
    expect(text()).toContain('Start Assemble boxes');
    expect(text()).toContain('This job is closed.');
    expect(text()).toContain('2:14');

    await press('Put it on something else');
    const dialog = await loader.getHarness(MatDialogHarness);
    const body = document.querySelector('mat-dialog-container')!;
    const choose = async (words: string) => {
      [...body.querySelectorAll('button')].find(({ textContent }) => textContent?.includes(words))!.click();
      await settle();
    };
    await choose('Not on a job');
    await choose('Shop, not on a job');
    expect(await loader.getAllHarnesses(MatDialogHarness)).not.toContain(dialog);
    const again = http.expectOne(shop('/time/clock-in')).request.body as { at: string; entryId: string };
    expect(again).toMatchObject({
      ...{ entryId: (first.request.body as { entryId: string }).entryId, jobId: null },
      at: (first.request.body as { at: string }).at,
    });
  });

  it('lets a refused punch go only after asking', async () => {
    const { press, http, shop, text, settle, loader } = await open(running());
    await press(/^ ?Assemble boxes/);
    http
      .expectOne(shop('/time/clock-in'))
      .flush(conflict('This job is closed.'), { status: 409, statusText: 'Conflict' });
    await settle();
    http.expectOne(shop('/time/clock')).flush(running());
    await press('Let it go');
    const dialog = await loader.getHarness(MatDialogHarness);
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Let it go' }))).click();
    await settle();
    expect(text()).not.toContain('was not taken');
  });

  it('asks when the work stopped, after a day that was too long', async () => {
    const startedAt = minutesAgo(20 * 60);
    const { press, http, shop, text, element, settle } = await open(
      running({ open: buildOpenEntry({ startedAt }) }),
    );
    expect(text()).toContain('When did you stop?');
    await press('Clock out then');
    expect(text()).toContain('Give the day and the time.');
    const stop = new Date(Date.parse(startedAt) + 8 * 3_600_000);
    const [day, time] = element.querySelectorAll('input');
    const wall = new Intl.DateTimeFormat('sv-SE', {
      ...{ timeZone: 'America/New_York', dateStyle: 'short', timeStyle: 'short' },
    }).format(stop);
    for (const [field, value] of [
      [day, wall.slice(0, 10)],
      [time, wall.slice(11)],
    ] as const) {
      field!.value = value;
      field!.dispatchEvent(new Event('input'));
    }
    await settle();
    await press('Clock out then');
    const { body } = http.expectOne(shop(`/time/entries/${FRAMES.entry}/clock-out`)).request;
    expect((body as { at: string }).at.slice(0, 16)).toBe(stop.toISOString().slice(0, 16));
  });

  it('opens at a job that it was led to', async () => {
    const { loader, settle } = await open(buildClock(), `/time/clock?jobId=${FRAMES.job}`);
    await settle();
    const dialog = await loader.getHarness(MatDialogHarness);
    expect(await dialog.getTitleText()).toBe('1042 · Mudroom lockers');
    expect(await dialog.getText()).toContain('Face frames');
  });

  it('says why nothing could be read, and tries again', async () => {
    const { http, shop, press, settle, text } = await open(null);
    http.expectOne(shop('/time/clock')).flush(null, { status: 500, statusText: '' });
    await settle();
    await press('Try again');
    http.expectOne(shop('/time/clock')).flush(running());
    await settle();
    expect(text()).toContain('2:14');
  });
});
