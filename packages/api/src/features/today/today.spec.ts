import type { NavCounts } from '@bookmatch/common/today/nav-counts-contract';
import type {
  BookkeeperToday,
  CrewToday,
  LeadHandToday,
  OwnerToday,
} from '@bookmatch/common/today/today-contract';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Books } from '../../../test/harness/books.js';
import type { Client } from '../../../test/harness/client.js';
import { ClockSteps } from '../../../test/harness/clock-steps.js';
import { sendEstimate } from '../../../test/harness/estimate-steps.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

/** A Wednesday, noon in Chicago; its workweek began on Monday, June 1. */
const NOON = '2026-06-03T17:00:00.000Z';
const TODAY = '2026-06-03';

describe('the first page', () => {
  let api: TestApi;
  let shop: TestShop;
  let books: Books;
  let clock: ClockSteps;
  beforeEach(async () => {
    api.clock.set(NOON);
    shop = await api.signUp({ timeZone: 'America/Chicago' });
    books = new Books(api, shop);
    clock = await ClockSteps.of(shop);
  });
  beforeAll(async () => {
    api = await TestApi.open({ now: NOON });
  });
  afterAll(() => api.close());

  const page = async <Page>(client: Client): Promise<Page> => {
    const answer = await client.get('/today');
    if (answer.status !== 200) throw new Error(answer.text);
    return answer.body as Page;
  };
  const lead = (title: string, nextStepOn: string | null) =>
    shop.owner.post('/leads', { title, contactName: 'Wren', source: 'website', nextStepOn });
  const issuedOn = async (day: string, dueOn: string) => {
    api.clock.set(`${day}T17:00:00.000Z`);
    const draft = await books.draft();
    const dated = await books.done<Invoice>(
      shop.owner.patch(`/invoices/${draft.id}`, { dueOn }, draft.version),
    );
    const invoice = await books.issue(dated);
    api.clock.set(NOON);
    return invoice;
  };

  it('of a new shop has nothing on it and breaks on nothing', async () => {
    expect(await page<OwnerToday>(shop.owner)).toMatchObject({
      role: 'owner',
      on: TODAY,
      leadsToFollowUp: { count: 0, rows: [] },
      estimatesWaiting: { count: 0, rows: [] },
      jobsInHand: { count: 0, rows: [] },
      overdueInvoices: { count: 0, rows: [] },
      aging: { totalCents: 0 },
      cashExpectedCents: 0,
      onTheClock: [],
      weekMinutes: 0,
    });
  });

  it('shows the owner the leads that are due, the oldest first, and counts the rest', async () => {
    for (let day = 1; day <= 9; day += 1)
      await lead(`Due ${day}`, `2026-05-${String(30 - day).padStart(2, '0')}`);
    await lead('Due today', TODAY);
    await lead('Due tomorrow', '2026-06-04');
    await lead('No step', null);
    const { leadsToFollowUp, leadsByStage } = await page<OwnerToday>(shop.owner);
    expect(leadsToFollowUp.count).toBe(10);
    expect(leadsToFollowUp.rows).toHaveLength(8);
    expect(leadsToFollowUp.rows[0]).toMatchObject({ title: 'Due 9', nextStepOn: '2026-05-21' });
    expect(leadsByStage).toEqual([
      { stage: 'new', count: 12 },
      { stage: 'contacted', count: 0 },
      { stage: 'site-visit', count: 0 },
      { stage: 'estimating', count: 0 },
    ]);
  });

  it('puts a customer’s question before every other estimate that waits, and drops those that expired', async () => {
    const first = await sendEstimate(api, shop.owner, { validUntil: TODAY });
    api.clock.forward({ minutes: 5 });
    const asked = await sendEstimate(api, shop.owner, { validUntil: TODAY });
    const waiting = async () => (await page<OwnerToday>(shop.owner)).estimatesWaiting;
    const ids = async () => (await waiting()).rows.map(({ id }) => id);
    expect(await ids()).toEqual([first.estimate.id, asked.estimate.id]);
    await asked.customer.post('/questions', { body: 'Can the crown be lower?' });
    expect(await waiting()).toMatchObject({
      count: 2,
      rows: [{ id: asked.estimate.id, openQuestions: 1 }, {}],
    });
    expect((await shop.owner.get('/today/counts')).body).toMatchObject({ estimates: 1 });
    api.clock.forward({ days: 2 });
    expect(await ids()).toEqual([asked.estimate.id]);
  });

  it('adds up what is late and what should come in within 30 days', async () => {
    const late = await issuedOn('2026-05-01', '2026-05-20');
    await issuedOn('2026-06-02', '2026-06-03');
    await issuedOn('2026-06-02', '2026-07-03');
    await issuedOn('2026-06-02', '2026-07-04');
    const today = await page<OwnerToday>(shop.owner);
    expect(today).toMatchObject({
      overdueInvoices: { count: 1, rows: [{ id: late.id, daysOverdue: 14 }] },
      overdueCents: 10_000,
      cashExpectedCents: 30_000,
      aging: { currentCents: 30_000, days1To30Cents: 10_000, totalCents: 40_000 },
    });
  });

  it('shows who is on the clock, the work of the week, and planned beside clocked of the jobs in hand', async () => {
    const jobId = await clock.job({ 'Face frames': 600 }, { title: 'Mudroom', installOn: '2026-06-05' });
    const { client: crew, memberId } = await shop.join('crew');
    await clock.worked(crew, jobId, '2026-06-01T14:00:00.000Z', '2026-06-01T16:30:00.000Z');
    await clock.worked(crew, jobId, '2026-05-29T14:00:00.000Z', '2026-05-29T15:00:00.000Z');
    await clock.clockIn(crew, clock.punch(jobId, '2026-06-03T16:00:00.000Z'));
    const today = await page<OwnerToday>(shop.owner);
    expect(today.weekMinutes).toBe(150);
    expect(today.onTheClock).toEqual([
      expect.objectContaining({ memberId, jobTitle: 'Mudroom', operationName: 'Face frames' }),
    ]);
    expect(today.jobsInHand).toMatchObject({
      count: 1,
      rows: [{ title: 'Mudroom', plannedMinutes: 600, clockedMinutes: 210, stage: 'accepted' }],
    });
    expect(today.jobsByStage[0]).toEqual({ stage: 'accepted', count: 1 });
  });

  it('shows the bookkeeper drafts, what is late and what came in since Monday, less what was taken back', async () => {
    const { client: bookkeeper } = await shop.join('bookkeeper');
    const draft = await books.draft();
    const late = await issuedOn('2026-05-01', '2026-05-20');
    const paid = await books.pay(await issuedOn('2026-05-28', '2026-06-20'), { receivedOn: '2026-06-01' });
    await books.pay(await issuedOn('2026-05-28', '2026-06-20'), { receivedOn: '2026-05-31' });
    const mine = new Books(api, shop, bookkeeper);
    const other = await mine.pay(await issuedOn('2026-05-28', '2026-06-20'), { receivedOn: '2026-06-02' });
    const wrong = await mine.pay(await issuedOn('2026-05-28', '2026-06-20'), { receivedOn: '2026-06-02' });
    const [payment] = wrong.payments;
    await mine.done(bookkeeper.post(`/payments/${payment?.id}/reverse`, { reason: 'Another customer' }));
    const today = await page<BookkeeperToday>(bookkeeper);
    expect(today).toMatchObject({
      role: 'bookkeeper',
      draftsToIssue: { count: 1, rows: [{ id: draft.id }] },
      overdueInvoices: { count: 1, rows: [{ id: late.id }] },
      overdueCents: 10_000,
      paidThisWeekCents: 20_000,
      aging: { totalCents: 20_000 },
    });
    expect(today.paymentsThisWeek.count).toBe(4);
    const kinds = today.paymentsThisWeek.rows.map(({ invoiceId, kind }) => [invoiceId, kind]);
    expect(kinds).toEqual(
      expect.arrayContaining([
        [wrong.id, 'reversal'],
        [wrong.id, 'payment'],
        [other.id, 'payment'],
        [paid.id, 'payment'],
      ]),
    );
    expect(today).not.toHaveProperty('leadsToFollowUp');
  });

  it('shows the lead hand jobs by their install, those of this week again, and no money', async () => {
    const { client: leadHand } = await shop.join('lead-hand');
    await clock.job({}, { title: 'No date' });
    await clock.job({}, { title: 'This Sunday', installOn: '2026-06-07' });
    await clock.job({}, { title: 'Next week', installOn: '2026-06-08' });
    const today = await page<LeadHandToday>(leadHand);
    expect(today.jobsInHand.rows.map(({ title }) => title)).toEqual(['This Sunday', 'Next week', 'No date']);
    expect(today.installsThisWeek.map(({ title }) => title)).toEqual(['This Sunday']);
    expect(today.clock).toMatchObject({ open: null, todayMinutes: 0 });
    expect(JSON.stringify(today)).not.toMatch(/cents/i);
  });

  it('shows the crew their clock and nothing else', async () => {
    const { client: crew } = await shop.join('crew');
    const today = await page<CrewToday>(crew);
    expect(Object.keys(today).sort()).toEqual(['clock', 'on', 'role']);
    expect(JSON.stringify(today)).not.toMatch(/cents/i);
  });

  it('counts beside the navigation what the one who asks can do something about', async () => {
    await lead('Due', '2026-06-01');
    await issuedOn('2026-05-01', '2026-05-20');
    const counts = async (client: Client) => (await client.get('/today/counts')).body as NavCounts;
    expect(await counts(shop.owner)).toEqual({ leads: 1, estimates: 0, invoices: 1 });
    expect(await counts((await shop.join('bookkeeper')).client)).toEqual({ invoices: 1 });
    expect(await counts((await shop.join('crew')).client)).toEqual({});
  });

  it('is of one shop alone', async () => {
    await lead('Due', '2026-06-01');
    const stranger = await api.signUp();
    expect((await page<OwnerToday>(stranger.owner)).leadsToFollowUp.count).toBe(0);
    expect((await stranger.owner.below(`/api/shops/${shop.id}`).get('/today')).status).toBe(404);
  });
});
