import type { MemberWeek, ShopWeek } from '@bookmatch/common/time/week-contract';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Member = Awaited<ReturnType<TestShop['join']>>;

describe('a week', () => {
  let api: TestApi;
  let shop: TestShop;
  let steps: ClockSteps;
  let jobId: string;
  let crew: Member;
  beforeAll(async () => {
    api = await TestApi.open({ now: '2026-06-03T17:00:00.000Z' });
    shop = await api.signUp();
    steps = await ClockSteps.of(shop);
    jobId = await steps.job();
  });
  afterAll(() => api.close());
  beforeEach(async () => {
    api.clock.set('2026-06-03T17:00:00.000Z');
    crew = await shop.join('crew');
  });

  const own = async (query: Record<string, string> = {}) =>
    (await crew.client.get('/time/week', query)).body as MemberWeek;
  const everybody = async (query: Record<string, string> = {}, client = shop.owner) =>
    (await client.get('/time/weeks', query)).body as ShopWeek;
  const setCost = async (laborCostCentsPerHour: number) => {
    const { rows } = (await shop.owner.get('/members')).body as { rows: { id: string; version: number }[] };
    const { version } = rows.find((row) => row.id === crew.memberId)!;
    await shop.owner.patch(`/members/${crew.memberId}/labor-cost`, { laborCostCentsPerHour }, version);
  };
  const csv = async (query: Record<string, string> = {}, client = shop.owner) =>
    client.get('/time/weeks/export', query);

  it('runs from Monday to Sunday on the wall of the shop', async () => {
    expect(await own()).toMatchObject({
      startsOn: '2026-06-01',
      endsOn: '2026-06-07',
      timeZone: 'America/Chicago',
      workMinutes: 0,
      entries: [],
    });
    expect((await own({ of: '2026-05-31' })).startsOn).toBe('2026-05-25');
    expect((await crew.client.get('/time/week', { of: 'last' })).status).toBe(400);
  });

  it('adds work and meal breaks up by day, and leaves open and voided entries out', async () => {
    await steps.worked(crew.client, jobId, '2026-06-01T13:00:00.000Z', '2026-06-01T17:00:00.000Z');
    const pause = await steps.clockIn(crew.client, steps.mealBreak('2026-06-01T17:00:00.000Z'));
    await steps.clockOut(crew.client, pause.entry.id, '2026-06-01T17:30:00.000Z');
    const twice = await steps.worked(
      crew.client,
      jobId,
      '2026-06-02T13:00:00.000Z',
      '2026-06-02T14:00:00.000Z',
    );
    await shop.owner.post(`/time/entries/${twice.id}/void`, { reason: 'Twice' }, { version: twice.version });
    await steps.clockIn(crew.client, steps.punch(jobId, '2026-06-03T13:00:00.000Z'));

    const week = await own();
    expect(week).toMatchObject({ workMinutes: 240, mealBreakMinutes: 30 });
    expect(week.days.slice(0, 3)).toEqual([
      { on: '2026-06-01', workMinutes: 240, mealBreakMinutes: 30 },
      { on: '2026-06-02', workMinutes: 0, mealBreakMinutes: 0 },
      { on: '2026-06-03', workMinutes: 0, mealBreakMinutes: 0 },
    ]);
    expect(week.entries).toHaveLength(4);
    const row = (await everybody()).members.find((member) => member.memberId === crew.memberId);
    expect(row).toMatchObject({
      workMinutes: 240,
      mealBreakMinutes: 30,
      hasOpenEntry: true,
      days: week.days,
    });
  });

  it('shares a shift over its midnight, minutes and cents, with the week before', async () => {
    await setCost(4_100);
    // Sunday 10 pm to Monday 1:07 am in Chicago.
    const shift = await steps.worked(
      crew.client,
      jobId,
      '2026-06-01T03:00:00.000Z',
      '2026-06-01T06:07:00.000Z',
    );
    const rows = await Promise.all(
      ['2026-05-27', '2026-06-03'].map(async (of) =>
        (await everybody({ of })).members.find((member) => member.memberId === crew.memberId),
      ),
    );
    expect(rows.map((row) => row?.workMinutes)).toEqual([120, 67]);
    const { costCents } = await steps.entry(shop.owner, shift.id);
    expect(rows.reduce((sum, row) => sum + (row?.costCents ?? 0), 0)).toBe(costCents);
    expect((await own({ of: '2026-05-27' })).entries.map((entry) => entry.id)).toEqual([shift.id]);
  });

  it('is everybody’s for office and lead hand, with cost for who may see money; the crew reads its own', async () => {
    const leadHand = await shop.join('lead-hand');
    const bookkeeper = await shop.join('bookkeeper');
    expect((await everybody({}, bookkeeper.client)).members[0]).toHaveProperty('costCents');
    const seen = await everybody({}, leadHand.client);
    expect(seen.members.length).toBeGreaterThan(2);
    expect(JSON.stringify(seen)).not.toMatch(/cents/i);
    expect((await crew.client.get('/time/weeks')).status).toBe(403);

    const path = `/time/weeks/${crew.memberId}`;
    const [byOwner, byLeadHand, byCrew] = await Promise.all(
      [shop.owner, leadHand.client, crew.client].map((client) => client.get(path)),
    );
    expect([byOwner?.status, byLeadHand?.status, byCrew?.status]).toEqual([200, 200, 200]);
    expect((await crew.client.get(`/time/weeks/${leadHand.memberId}`)).status).toBe(404);
    const stranger = await api.signUp();
    expect((await stranger.owner.get(path)).status).toBe(404);
    expect((await stranger.owner.below(`/api/shops/${shop.id}`).get(path)).status).toBe(404);
  });

  it('keeps a member who left in the weeks they worked', async () => {
    await steps.worked(crew.client, jobId, '2026-06-01T13:00:00.000Z', '2026-06-01T14:00:00.000Z');
    const { rows } = (await shop.owner.get('/members')).body as { rows: { id: string; version: number }[] };
    const { version } = rows.find((row) => row.id === crew.memberId)!;
    expect((await shop.owner.delete(`/members/${crew.memberId}`, version)).status).toBeLessThan(300);
    const names = async (of: string) => (await everybody({ of })).members.map((member) => member.memberId);
    expect(await names('2026-06-01')).toContain(crew.memberId);
    expect(await names('2026-06-08')).not.toContain(crew.memberId);
  });

  it('leaves as CSV that adds up to the screen, with formulas made harmless', async () => {
    await setCost(4_100);
    const title = '=1+1 lockers';
    const job = await steps.job({}, { title });
    await steps.worked(crew.client, job, '2026-05-19T03:00:00.000Z', '2026-05-19T06:07:00.000Z');
    const open = await steps.clockIn(crew.client, steps.punch(job, '2026-05-20T13:00:00.000Z'));
    const answer = await csv({ of: '2026-05-20' });
    await steps.clockOut(crew.client, open.entry.id, '2026-05-20T14:00:00.000Z');
    expect(answer.headers).toMatchObject({
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': "attachment; filename*=UTF-8''time-2026-05-18.csv",
    });
    const [head, ...lines] = answer.text.trim().split('\r\n');
    expect(head).toBe(
      'Member,Date,Day,From,To,Kind,Minutes,Hours,Job,Title,Operation,Note,Corrected,Labor cost',
    );
    expect(lines.map((line) => line.split(',').slice(1, 8).join(','))).toEqual([
      '2026-05-18,Mon,10:00 pm,1:07 am,Work,120,2.00',
      '2026-05-19,Tue,10:00 pm,1:07 am,Work,67,1.12',
    ]);
    expect(answer.text).toContain("'=1+1 lockers");
    expect(lines.map((line) => line.split(',').at(-1))).toEqual(['82.00', '45.78']);
  });

  it('is exported by the office only', async () => {
    expect((await csv({}, (await shop.join('bookkeeper')).client)).status).toBe(200);
    expect((await csv({}, (await shop.join('lead-hand')).client)).status).toBe(403);
    expect((await csv({}, crew.client)).status).toBe(403);
  });
});

describe('a week in which the clocks change', () => {
  let api: TestApi;
  let shop: TestShop;
  let steps: ClockSteps;
  let jobId: string;
  beforeAll(async () => {
    api = await TestApi.open({ now: '2027-12-01T12:00:00.000Z' });
    shop = await api.signUp();
    steps = await ClockSteps.of(shop);
    jobId = await steps.job();
  });
  afterAll(() => api.close());

  const weekOf = async (of: string) => (await shop.owner.get('/time/week', { of })).body as MemberWeek;

  it('is an hour shorter when the clocks go forward, and an hour longer when they go back', async () => {
    // 11 pm on Saturday to 7 am on Sunday in Chicago: 7 hours in March, 9 in November.
    await steps.worked(shop.owner, jobId, '2027-03-14T05:00:00.000Z', '2027-03-14T12:00:00.000Z');
    await steps.worked(shop.owner, jobId, '2027-11-07T04:00:00.000Z', '2027-11-07T13:00:00.000Z');
    const march = await weekOf('2027-03-10');
    expect(march.days.slice(5).map((day) => day.workMinutes)).toEqual([60, 360]);
    const november = await weekOf('2027-11-03');
    expect(november.days.slice(5).map((day) => day.workMinutes)).toEqual([60, 480]);
    expect([march.workMinutes, november.workMinutes]).toEqual([420, 540]);
  });
});
