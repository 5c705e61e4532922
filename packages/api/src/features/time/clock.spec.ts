import { randomUUID } from 'node:crypto';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import type { Client } from '../../../test/harness/client.js';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';
import { systemStamp } from '../../platform/database/stamp.js';
import { Member } from '../shops/shops-public.js';

/** A Wednesday; noon in Chicago. */
const NOON = '2026-06-03T17:00:00.000Z';
const at = (time: string) => `2026-06-03T${time}:00.000Z`;

describe('the clock', () => {
  let api: TestApi;
  let shop: TestShop;
  let steps: ClockSteps;
  let jobId: string;
  let crew: Client;
  let crewId: string;
  beforeAll(async () => {
    api = await TestApi.open({ now: NOON });
    shop = await api.signUp();
    steps = await ClockSteps.of(shop);
  });
  afterAll(() => api.close());
  beforeEach(async () => {
    api.clock.set(NOON);
    jobId = await steps.job();
    ({ client: crew, memberId: crewId } = await shop.join('crew'));
  });

  const entriesOf = async (client: Client, memberId: string) =>
    ((await client.get('/time/entries', { memberId })).body as { rows: TimeEntryRow[] }).rows;
  const open = (rows: TimeEntryRow[]) => rows.filter((row) => row.endedAt === null);

  it('clocks in, shows what is running, and clocks out', async () => {
    const { entry, clock } = await steps.clockIn(crew, steps.punch(jobId, at('14:31')));
    expect(entry).toMatchObject({
      memberId: crewId,
      jobId,
      jobTitle: 'Mudroom lockers',
      operationName: 'Face frames',
      startedAt: at('14:31'),
      endedAt: null,
      minutes: null,
      source: 'phone',
      corrected: false,
    });
    expect(clock).toMatchObject({ open: { id: entry.id }, todayMinutes: 0 });
    expect(await steps.state(crew)).toEqual(clock);

    const out = await steps.clockOut(crew, entry.id, at('16:45'));
    expect(out.entry).toMatchObject({ endedAt: at('16:45'), minutes: 134 });
    expect(out.clock).toMatchObject({ open: null, todayMinutes: 134 });
  });

  it('keeps a punch to the minute it falls in', async () => {
    const { entry } = await steps.clockIn(crew, steps.punch(jobId, '2026-06-03T14:31:59.999Z'));
    expect(entry.startedAt).toBe(at('14:31'));
  });

  it('switches: the open entry ends where the next begins', async () => {
    const first = await steps.clockIn(crew, steps.punch(jobId, at('12:00')));
    const second = await steps.clockIn(
      crew,
      steps.punch(jobId, at('14:00'), { operationId: steps.operation('Assemble boxes') }),
    );
    expect(second.clock.open).toMatchObject({ operationName: 'Assemble boxes', startedAt: at('14:00') });
    expect(await steps.entry(crew, first.entry.id)).toMatchObject({ endedAt: at('14:00'), minutes: 120 });
  });

  it('takes a meal break and shop time on no job; a break is no work', async () => {
    await steps.clockIn(crew, steps.punch(null, at('12:00')));
    const pause = await steps.clockIn(crew, steps.mealBreak(at('15:00')));
    expect(pause.entry).toMatchObject({ kind: 'meal-break', jobId: null, operationId: null });
    const { clock } = await steps.clockOut(crew, pause.entry.id, at('15:30'));
    expect(clock.todayMinutes).toBe(180);
  });

  it('answers the same entry however often its punch is sent', async () => {
    const punch = steps.punch(jobId, at('14:00'));
    const answers = await Promise.all(Array.from({ length: 8 }, () => crew.post('/time/clock-in', punch)));
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]));
    await steps.clockOut(crew, punch.entryId, at('15:00'));
    const late = await steps.clockIn(crew, punch);
    expect(late.entry).toMatchObject({ id: punch.entryId, endedAt: at('15:00') });
    expect(late.clock.open).toBeNull();
    const again = await steps.clockOut(crew, punch.entryId, at('16:00'));
    expect(again.entry.endedAt).toBe(at('15:00'));
    expect(await entriesOf(crew, crewId)).toHaveLength(1);
  });

  it('has exactly one entry open after 50 punches at once', async () => {
    const punches = Array.from({ length: 50 }, () => steps.punch(jobId, NOON));
    const answers = await Promise.all(punches.map((punch) => crew.post('/time/clock-in', punch)));
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([200]));
    const rows = await entriesOf(crew, crewId);
    expect(rows).toHaveLength(50);
    expect(open(rows)).toHaveLength(1);
  });

  it('closes an entry once when the same clock-out comes 20 times at different instants', async () => {
    const { entry } = await steps.clockIn(crew, steps.punch(jobId, at('12:00')));
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, minute) =>
        crew.post(`/time/entries/${entry.id}/clock-out`, { at: at(`13:${10 + minute}`) }),
      ),
    );
    expect(new Set(answers.map(({ body }) => (body as { entry: TimeEntryRow }).entry.endedAt)).size).toBe(1);
  });

  it('begins nothing for somebody who is removed while their punch waits', async () => {
    const { work, clock } = api.platform;
    let waiting: Promise<{ status: number }> | undefined;
    await work.transaction(systemStamp('leaving', clock()), async (scope) => {
      const members = scope.forShop(shop.id).rows(Member);
      const member = await members.getForUpdate(crewId);
      waiting = crew.post('/time/clock-in', steps.punch(jobId, NOON));
      await new Promise((resolve) => setTimeout(resolve, 500));
      await members.update(member, { removedAt: scope.now });
    });
    expect((await waiting)?.status).toBe(404);
    expect(await entriesOf(shop.owner, crewId)).toEqual([]);
  });

  it('lets the database itself hold one open entry a member', async () => {
    const { entry } = await steps.clockIn(crew, steps.punch(jobId, at('14:00')));
    const copy = api.platform.dataSource.query(
      `insert into time_entry (shop_id, id, created_at, version, updated_at, member_id, kind, started_at, note, source, corrected)
       select shop_id, ?, created_at, 1, updated_at, member_id, 'meal-break', started_at, '', 'desk', 0 from time_entry where id = ?`,
      [randomUUID(), entry.id],
    );
    await expect(copy).rejects.toMatchObject({ errno: 1062 });
  });

  it('takes punches that were kept for a day in their order', async () => {
    api.clock.forward({ hours: 22 });
    const first = await steps.clockIn(crew, steps.punch(jobId, at('12:00')));
    const second = await steps.clockIn(crew, steps.mealBreak(at('16:00')));
    const third = await steps.clockIn(crew, steps.punch(jobId, at('16:30')));
    await steps.clockOut(crew, third.entry.id, at('20:00'));
    const rows = await entriesOf(crew, crewId);
    expect(rows.map(({ id, minutes }) => [id, minutes])).toEqual([
      [third.entry.id, 210],
      [second.entry.id, 30],
      [first.entry.id, 240],
    ]);
  });

  it.each([
    ['that starts in the future', () => steps.punch(jobId, at('17:06')), 409, 'at'],
    ['without an operation', () => steps.punch(jobId, NOON, { operationId: null }), 422, 'operationId'],
    [
      'of shop time on a job',
      () => steps.punch(jobId, NOON, { operationId: steps.operation('Shop, not on a job') }),
      409,
      'operationId',
    ],
    [
      'of work on no job',
      () => steps.punch(null, NOON, { operationId: steps.operation('Face frames') }),
      409,
      'jobId',
    ],
    ['for somebody else', () => steps.punch(jobId, NOON, { memberId: randomUUID() }), 422, 'memberId'],
    [
      'with a rate',
      () => steps.punch(jobId, NOON, { laborCostCentsPerHour: 1 }),
      422,
      'laborCostCentsPerHour',
    ],
    ['with an id that is none', () => steps.punch(jobId, NOON, { entryId: '1e3' }), 422, 'entryId'],
  ])('refuses a punch %s', async (_, punch, status, path) => {
    const answer = await crew.post('/time/clock-in', punch());
    expect(answer.status).toBe(status);
    expect((answer.body as { fields: { path: string }[] }).fields.map((field) => field.path)).toContain(path);
    expect(await entriesOf(crew, crewId)).toEqual([]);
  });

  it('refuses a punch into time that is entered already, and one before the open entry began', async () => {
    await steps.worked(crew, jobId, at('12:00'), at('14:00'));
    expect((await crew.post('/time/clock-in', steps.punch(jobId, at('13:00')))).status).toBe(409);
    await steps.clockIn(crew, steps.punch(jobId, at('15:00')));
    expect((await crew.post('/time/clock-in', steps.punch(jobId, at('14:30')))).status).toBe(409);
  });

  it('asks for the true end of an entry that was forgotten overnight', async () => {
    const { entry } = await steps.clockIn(crew, steps.punch(jobId, at('14:00')));
    api.clock.forward({ hours: 20 });
    const tomorrow = api.clock.read().toISOString();
    const refused = await crew.post(`/time/entries/${entry.id}/clock-out`, { at: tomorrow });
    expect(refused.status).toBe(409);
    expect(refused.body).toMatchObject({ detail: expect.stringMatching(/really stopped/) });
    expect((await steps.clockOut(crew, entry.id, at('22:30'))).entry.minutes).toBe(510);
  });

  it('refuses a closed job, an archived operation and a job that one may not see', async () => {
    const hidden = await steps.job({}, { openToCrew: false });
    expect((await crew.post('/time/clock-in', steps.punch(hidden, NOON))).status).toBe(404);
    const { body } = await shop.owner.get(`/jobs/${jobId}`);
    const { version } = body as { version: number };
    const closing = { stage: 'closed', confirmSkip: true, reason: 'Billed by hand' };
    expect((await shop.owner.post(`/jobs/${jobId}/move`, closing, { version })).status).toBe(200);
    const closed = await crew.post('/time/clock-in', steps.punch(jobId, NOON));
    expect(closed.status).toBe(409);
    expect(closed.body).toMatchObject({ detail: 'This job is closed.' });

    const made = await shop.owner.post('/operations', { name: 'Turn legs' });
    const { id } = made.body as { id: string };
    await shop.owner.patch(`/operations/${id}`, { archived: true }, 1);
    const archived = steps.punch(await steps.job(), NOON, { operationId: id });
    expect((await crew.post('/time/clock-in', archived)).status).toBe(409);
  });

  it('keeps a job open while somebody is clocked in to it', async () => {
    await steps.clockIn(crew, steps.punch(jobId, NOON));
    const closing = { stage: 'closed', confirmSkip: true, reason: 'Billed by hand' };
    const answer = await shop.owner.post(`/jobs/${jobId}/move`, closing, { version: 1 });
    expect(answer.status).toBe(409);
    expect((answer.body as { detail: string }).detail).toMatch(/crew \d+/);
  });

  it('is everybody’s own: nobody clocks somebody else out', async () => {
    const { entry } = await steps.clockIn(crew, steps.punch(jobId, NOON));
    const leadHand = await shop.join('lead-hand');
    const other = await shop.join('crew');
    const out = `/time/entries/${entry.id}/clock-out`;
    expect((await leadHand.client.post(out, { at: NOON })).status).toBe(403);
    expect((await other.client.post(out, { at: NOON })).status).toBe(404);
    const taken = steps.punch(jobId, NOON, { entryId: entry.id });
    expect((await other.client.post('/time/clock-in', taken)).status).toBe(404);
    expect((await other.client.get(`/time/entries/${entry.id}`)).status).toBe(404);
  });

  it('answers ids of another shop like ids that do not exist', async () => {
    const stranger = await api.signUp();
    const theirs = await ClockSteps.of(stranger);
    const foreignJob = steps.punch(await theirs.job(), NOON);
    const foreignOperation = steps.punch(jobId, NOON, { operationId: theirs.operation('Face frames') });
    for (const punch of [foreignJob, foreignOperation])
      expect((await crew.post('/time/clock-in', punch)).status).toBe(404);
    const { entry } = await steps.clockIn(crew, steps.punch(jobId, NOON));
    expect((await stranger.owner.post(`/time/entries/${entry.id}/clock-out`, { at: NOON })).status).toBe(404);
  });

  it('offers recent work first, then assigned jobs, then what belongs to no job, with the minutes left', async () => {
    const assigned = await steps.job(
      { 'Cut sheet goods': 480, 'Assemble boxes': 300 },
      { title: 'Library wall', openToCrew: false },
    );
    await shop.owner.post(`/jobs/${assigned}/assign`, { memberIds: [crewId] }, { version: 1 });
    await steps.worked(crew, jobId, at('12:00'), at('14:00'));
    await steps.worked(crew, assigned, at('14:00'), at('15:30'), {
      operationId: steps.operation('Assemble boxes'),
    });
    const other = await shop.join('crew');
    await steps.worked(other.client, jobId, at('12:00'), at('12:45'));

    const { choices } = await steps.state(crew);
    expect(choices.map((row) => [row.operationName, row.jobTitle, row.minutesLeft, row.recent])).toEqual([
      ['Assemble boxes', 'Library wall', 210, true],
      ['Face frames', 'Mudroom lockers', 600 - 165, true],
      ['Cut sheet goods', 'Library wall', 480, false],
      ['Shop, not on a job', null, null, false],
    ]);
    expect((await steps.state(other.client)).choices).toHaveLength(2);
  });

  it('offers every open job that one may see, for work that is not among the choices', async () => {
    const hidden = await steps.job({}, { openToCrew: false });
    await steps.worked(crew, jobId, at('12:00'), at('13:00'));
    const { body } = await crew.get('/time/clock/jobs');
    const { jobs, operations } = body as {
      jobs: { jobId: string; planned: object[] }[];
      operations: { operationName: string; onJob: boolean }[];
    };
    expect(jobs.map((job) => job.jobId)).toContain(jobId);
    expect(jobs.map((job) => job.jobId)).not.toContain(hidden);
    expect(jobs.find((job) => job.jobId === jobId)?.planned).toEqual([
      { operationId: steps.operation('Face frames'), minutesLeft: 540 },
    ]);
    expect(operations.find((row) => row.operationName === 'Measure and draw')).toMatchObject({ onJob: true });
    expect(operations.find((row) => row.operationName === 'Shop, not on a job')).toMatchObject({
      onJob: false,
    });
  });

  it('counts today on the wall of the shop, also of a shift that ran in from yesterday', async () => {
    // 11 pm on Tuesday to 1 am on Wednesday in Chicago.
    await steps.worked(crew, jobId, '2026-06-03T04:00:00.000Z', '2026-06-03T06:00:00.000Z');
    expect((await steps.state(crew)).todayMinutes).toBe(60);
  });

  it('says nothing of money to anybody', async () => {
    const { entry, clock } = await steps.clockIn(shop.owner, steps.punch(jobId, NOON));
    expect(JSON.stringify({ entry, clock })).not.toMatch(/cents/i);
    await steps.clockOut(shop.owner, entry.id, NOON);
  });
});
