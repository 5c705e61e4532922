import type { TimeEntry, TimeEntryRow } from '@bookmatch/common/time/time-contract';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Member = Awaited<ReturnType<TestShop['join']>>;
const NOON = '2026-06-03T17:00:00.000Z';
const at = (time: string) => `2026-06-03T${time}:00.000Z`;

describe('time put right afterwards', () => {
  let api: TestApi;
  let shop: TestShop;
  let steps: ClockSteps;
  let jobId: string;
  let leadHand: Member;
  let crew: Member;
  beforeAll(async () => {
    api = await TestApi.open({ now: NOON });
    shop = await api.signUp();
    steps = await ClockSteps.of(shop);
    jobId = await steps.job();
    leadHand = await shop.join('lead-hand');
  });
  afterAll(() => api.close());
  beforeEach(async () => {
    api.clock.set(NOON);
    crew = await shop.join('crew');
  });

  const setCost = async (memberId: string, laborCostCentsPerHour: number) => {
    const { rows } = (await shop.owner.get('/members')).body as { rows: { id: string; version: number }[] };
    const version = rows.find((row) => row.id === memberId)!.version;
    const answer = await shop.owner.patch(
      `/members/${memberId}/labor-cost`,
      { laborCostCentsPerHour },
      version,
    );
    expect(answer.status).toBe(200);
  };
  const add = (fields: object = {}, client = leadHand.client) =>
    client.post('/time/entries', {
      ...{ memberId: crew.memberId, jobId, operationId: steps.operation('Face frames'), kind: 'work' },
      ...{ startedAt: at('12:00'), endedAt: at('14:30'), reason: 'Forgot to clock in' },
      ...fields,
    });
  const added = async (fields: object = {}) => {
    const answer = await add(fields);
    if (answer.status !== 201) throw new Error(answer.text);
    return answer.body as TimeEntry;
  };
  const correct = (entry: { id: string; version: number }, fields: object, client = leadHand.client) =>
    client.patch(`/time/entries/${entry.id}`, { reason: 'Wrong', ...fields }, entry.version);
  const fieldsOf = (body: unknown) => (body as { fields: { path: string }[] }).fields.map(({ path }) => path);

  it('adds a forgotten stretch with its reason', async () => {
    const entry = await added({ note: 'Pencil list' });
    expect(entry).toMatchObject({
      memberId: crew.memberId,
      minutes: 150,
      source: 'correction',
      corrected: true,
      note: 'Pencil list',
      corrections: [
        {
          by: expect.stringMatching(/^lead-hand/),
          reason: 'Forgot to clock in',
          before: null,
          after: { startedAt: at('12:00'), endedAt: at('14:30'), jobId, kind: 'work' },
        },
      ],
    });
  });

  it('changes what is named, leaves the rest, and keeps what stood there', async () => {
    const entry = await steps.worked(crew.client, jobId, at('12:00'), at('16:00'));
    const answer = await correct(entry, { endedAt: at('15:15'), reason: 'Left early' });
    expect(answer.status).toBe(200);
    expect(answer.headers['etag']).toBe(`"${entry.version + 1}"`);
    expect(answer.body).toMatchObject({
      startedAt: at('12:00'),
      endedAt: at('15:15'),
      minutes: 195,
      jobId,
      source: 'phone',
      corrected: true,
      corrections: [
        { reason: 'Left early', before: { endedAt: at('16:00') }, after: { endedAt: at('15:15') } },
      ],
    });
    const again = await correct(answer.body as TimeEntry, { note: 'Truck' });
    expect((again.body as TimeEntry).corrections.map((row) => row.reason)).toEqual(['Left early', 'Wrong']);
  });

  it('leaves no trace of a correction that changes nothing', async () => {
    const entry = await steps.worked(crew.client, jobId, at('12:00'), at('16:00'));
    const answer = await correct(entry, { endedAt: at('16:00'), jobId });
    expect(answer.body).toMatchObject({ version: entry.version, corrected: false, corrections: [] });
  });

  it('moves an entry to another job, makes it a meal break, and back', async () => {
    const other = await steps.job({}, { title: 'Library wall' });
    const entry = await steps.worked(crew.client, jobId, at('12:00'), at('12:30'));
    const moved = (await correct(entry, { jobId: other })).body as TimeEntry;
    expect(moved.jobTitle).toBe('Library wall');
    const pause = (await correct(moved, { kind: 'meal-break' })).body as TimeEntry;
    expect(pause).toMatchObject({ kind: 'meal-break', jobId: null, operationId: null, minutes: 30 });
    const bare = await correct(pause, { kind: 'work' });
    expect([bare.status, fieldsOf(bare.body)]).toEqual([409, ['operationId']]);
    const work = { kind: 'work', jobId, operationId: steps.operation('Install') };
    expect((await correct(pause, work)).body).toMatchObject({ operationName: 'Install' });
  });

  it('ends an entry that was left open', async () => {
    const { entry } = await steps.clockIn(crew.client, steps.punch(jobId, at('12:00')));
    api.clock.forward({ days: 3 });
    const answer = await correct(entry, { endedAt: at('21:00'), reason: 'Went home' });
    expect(answer.body).toMatchObject({ minutes: 540 });
    expect((await steps.state(crew.client)).open).toBeNull();
  });

  it('voids an entry: it stays to be read and counts nowhere, and its time is free again', async () => {
    const entry = await steps.worked(crew.client, jobId, at('12:00'), at('14:00'));
    const path = `/time/entries/${entry.id}/void`;
    expect((await leadHand.client.post(path, { reason: '' }, { version: entry.version })).status).toBe(422);
    expect((await leadHand.client.post(path, { reason: 'Twice' })).status).toBe(428);
    const answer = await leadHand.client.post(path, { reason: 'Twice' }, { version: entry.version });
    expect(answer.body).toMatchObject({
      voidedAt: expect.any(String),
      corrections: [{ reason: 'Twice', before: { endedAt: at('14:00') }, after: null }],
    });
    expect((await steps.state(crew.client)).todayMinutes).toBe(0);
    const { version } = answer.body as TimeEntry;
    expect((await correct({ id: entry.id, version }, { note: 'Late' })).status).toBe(409);
    expect((await add()).status).toBe(201);
  });

  it('voids an open entry, and the member can clock in again', async () => {
    const { entry } = await steps.clockIn(crew.client, steps.punch(jobId, at('12:00')));
    await leadHand.client.post(`/time/entries/${entry.id}/void`, { reason: 'Twice' }, { version: 1 });
    const late = await steps.clockOut(crew.client, entry.id, at('13:00'));
    expect(late.entry).toMatchObject({ endedAt: null, voidedAt: expect.any(String) });
    await steps.clockIn(crew.client, steps.punch(jobId, at('12:00')));
  });

  it.each([
    ['ends before it starts', { startedAt: at('14:00'), endedAt: at('13:00') }, 'endedAt'],
    ['is longer than 16 hours', { startedAt: '2026-06-02T00:00:00.000Z', endedAt: at('10:00') }, 'endedAt'],
    ['lies in the future', { startedAt: at('16:00'), endedAt: at('18:00') }, 'endedAt'],
  ])('refuses time that %s', async (_, times, path) => {
    const answer = await add(times);
    expect([answer.status, fieldsOf(answer.body)]).toEqual([409, [path]]);
  });

  it('refuses time that overlaps with other time of the same member, also with what is running', async () => {
    const first = await added({ startedAt: at('12:00'), endedAt: at('13:00') });
    expect((await add({ startedAt: at('12:59'), endedAt: at('13:30') })).status).toBe(409);
    expect((await add({ startedAt: at('13:00'), endedAt: at('13:30') })).status).toBe(201);
    expect((await correct(first, { endedAt: at('13:10') })).status).toBe(409);
    await steps.clockIn(crew.client, steps.punch(jobId, at('15:00')));
    expect((await add({ startedAt: at('14:30'), endedAt: at('15:01') })).status).toBe(409);
    expect((await correct(first, { operationId: steps.operation('Install') })).status).toBe(200);
  });

  it('lets one of 20 that overlap through', async () => {
    const answers = await Promise.all(Array.from({ length: 20 }, () => add()));
    expect(answers.map(({ status }) => status).filter((status) => status === 201)).toHaveLength(1);
    expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([201, 409]));
  });

  it('gives way to whoever was quicker', async () => {
    const entry = await added();
    expect((await correct(entry, { note: 'One' })).status).toBe(200);
    const stale = await correct(entry, { note: 'Two' });
    expect(stale.status).toBe(412);
    expect(stale.body).toMatchObject({ facts: { version: entry.version + 1 } });
    const { rows } = (await leadHand.client.get('/time/entries', { memberId: crew.memberId })).body as {
      rows: TimeEntryRow[];
    };
    expect(rows[0]?.note).toBe('One');
  });

  it('may name a closed job: what was done there stays to be put right', async () => {
    const closed = await steps.job({}, { title: 'Gone' });
    const closing = { stage: 'closed', confirmSkip: true, reason: 'Billed by hand' };
    await shop.owner.post(`/jobs/${closed}/move`, closing, { version: 1 });
    expect((await add({ jobId: closed })).status).toBe(201);
  });

  it('is not for the crew, and nobody reaches another shop by it', async () => {
    const entry = await steps.worked(crew.client, jobId, at('12:00'), at('13:00'));
    expect((await add({}, crew.client)).status).toBe(403);
    expect((await correct(entry, { note: 'Mine' }, crew.client)).status).toBe(403);
    const stranger = await api.signUp();
    const theirs = await ClockSteps.of(stranger);
    expect((await correct(entry, { note: 'Theirs' }, stranger.owner)).status).toBe(404);
    expect((await correct(entry, { jobId: await theirs.job() })).status).toBe(404);
    expect((await correct(entry, { operationId: theirs.operation('Install') })).status).toBe(404);
    expect((await add({ memberId: (await stranger.join('crew')).memberId })).status).toBe(404);
  });

  it('keeps the history where nobody can change it', async () => {
    const { id } = await added();
    const database = api.platform.dataSource;
    await expect(database.query('update time_correction set reason = ?', ['None'])).rejects.toThrow(/denied/);
    await expect(database.query('delete from time_correction where entry_id = ?', [id])).rejects.toThrow(
      /denied/,
    );
  });

  describe('costs', () => {
    it('stay what an hour cost when the entry began', async () => {
      await setCost(crew.memberId, 4_100);
      const { entry } = await steps.clockIn(crew.client, steps.punch(jobId, at('12:00')));
      await setCost(crew.memberId, 9_900);
      await steps.clockOut(crew.client, entry.id, at('13:30'));
      expect(await steps.entry(shop.owner, entry.id)).toMatchObject({ costCents: 6_150 });
      await correct(await steps.entry(shop.owner, entry.id), { endedAt: at('14:00') });
      expect(await steps.entry(shop.owner, entry.id)).toMatchObject({ costCents: 8_200 });
      const pause = await steps.entry(shop.owner, entry.id);
      await correct(pause, { kind: 'meal-break' });
      expect(await steps.entry(shop.owner, entry.id)).toMatchObject({ costCents: 0 });
    });

    it('are unknown where nobody has said what an hour costs', async () => {
      const entry = await steps.worked(crew.client, jobId, at('12:00'), at('13:00'));
      expect(await steps.entry(shop.owner, entry.id)).toMatchObject({ costCents: null });
    });

    it('are seen by owner and bookkeeper; for the others there is no such key', async () => {
      await setCost(crew.memberId, 4_100);
      const entry = await steps.worked(crew.client, jobId, at('12:00'), at('13:00'));
      const bookkeeper = await shop.join('bookkeeper');
      for (const client of [shop.owner, bookkeeper.client]) {
        expect(await steps.entry(client, entry.id)).toHaveProperty('costCents', 4_100);
        expect((await client.get('/time/entries', { memberId: crew.memberId })).text).toMatch(/costCents/);
      }
      for (const client of [leadHand.client, crew.client]) {
        expect(await steps.entry(client, entry.id)).not.toHaveProperty('costCents');
        expect((await client.get('/time/entries', { memberId: crew.memberId })).text).not.toMatch(/cents/i);
      }
      expect((await correct(entry, { note: 'Seen' })).text).not.toMatch(/cents/i);
    });
  });

  describe('the list', () => {
    it('shows the crew its own entries only, whatever it asks for', async () => {
      await steps.worked(crew.client, jobId, at('12:00'), at('13:00'));
      const own = (await crew.client.get('/time/entries')).body as { rows: TimeEntryRow[]; total: number };
      expect(own.total).toBe(1);
      const other = await shop.join('crew');
      expect((await other.client.get('/time/entries', { memberId: crew.memberId })).body).toMatchObject({
        rows: [],
        total: 0,
      });
    });

    it('takes days on the wall of the shop, both included', async () => {
      // 11:30 pm on Tuesday to 12:30 am on Wednesday in Chicago.
      await steps.worked(crew.client, jobId, '2026-06-03T04:30:00.000Z', '2026-06-03T05:30:00.000Z');
      const on = async (day: string) =>
        (await crew.client.get('/time/entries', { from: day, to: day })).body as { total: number };
      expect((await on('2026-06-01')).total).toBe(0);
      expect((await on('2026-06-02')).total).toBe(1);
      expect((await on('2026-06-03')).total).toBe(1);
      expect((await on('2026-06-04')).total).toBe(0);
    });

    it('pages by start without losing or repeating a row, and refuses an unknown order', async () => {
      for (const hour of ['10', '11', '12', '13', '14'])
        await steps.worked(crew.client, jobId, at(`${hour}:00`), at(`${hour}:30`));
      const seen: string[] = [];
      let after: Record<string, string> | null = {};
      while (after) {
        const answer = await crew.client.get('/time/entries', { limit: '2', sort: 'startedAt', ...after });
        const page = answer.body as { rows: TimeEntryRow[]; next: string | null };
        seen.push(...page.rows.map((row) => row.startedAt));
        after = page.next ? { after: page.next } : null;
      }
      expect(seen).toEqual(['10', '11', '12', '13', '14'].map((hour) => at(`${hour}:00`)));
      expect((await crew.client.get('/time/entries', { sort: 'memberId' })).status).toBe(400);
    });
  });
});
