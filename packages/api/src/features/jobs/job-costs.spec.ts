import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import type { JobCost } from '@bookmatch/common/jobs/job-costs-contract';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('the costs of a job', () => {
  let api: TestApi;
  let shop: TestShop;
  let jobId: string;
  beforeAll(async () => {
    api = await TestApi.open({ now: '2026-06-02T03:00:00.000Z' });
    shop = await api.signUp({ timeZone: 'America/Chicago' });
    const customer = await shop.owner.post('/customers', { kind: 'contractor', name: 'Low Fold Homes' });
    const { id } = customer.body as { id: string };
    jobId = ((await shop.owner.post('/jobs', { title: 'Bar', customerId: id })).body as Job).id;
  });
  afterAll(() => api.close());

  const cost = {
    category: 'hardware',
    description: 'Undermount slides',
    amountCents: 21_640,
    onDate: '2026-06-01',
  };
  const add = async (fields: object = {}) =>
    (await shop.owner.post(`/jobs/${jobId}/costs`, { ...cost, ...fields })).body as JobCost;
  const actual = async () => ((await shop.owner.get(`/jobs/${jobId}`)).body as Job).money!.actualCostCents;
  const reverse = (id: string, reason = 'Entered twice', client = shop.owner) =>
    client.post(`/jobs/${jobId}/costs/${id}/reverse`, { reason });

  it('count in the job and in the list, and are taken back by a row of the opposite amount', async () => {
    const before = await actual();
    const { id } = await add({ supplier: 'Mill Street Hardware' });
    expect(await actual()).toBe(before + 21_640);
    const reversal = await reverse(id);
    expect(reversal.status).toBe(201);
    expect(reversal.body).toMatchObject({ amountCents: -21_640, reversesId: id, reason: 'Entered twice' });
    expect(await actual()).toBe(before);
    const { rows } = (await shop.owner.get(`/jobs/${jobId}/costs`)).body as { rows: JobCost[] };
    expect(rows[0]?.id).toBe((reversal.body as JobCost).id);
    expect(rows.find((row) => row.id === id)).toMatchObject({
      reversedById: (reversal.body as JobCost).id,
      recordedBy: 'Owner 1',
    });
    const list = (await shop.owner.get('/jobs')).body as { rows: { actualCostCents: number }[] };
    expect(list.rows[0]?.actualCostCents).toBe(before);
  });

  it('are taken back once, also when twenty try at the same time', async () => {
    const before = await actual();
    const { id } = await add();
    const answers = await Promise.all(Array.from({ length: 20 }, () => reverse(id)));
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(1);
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(19);
    expect(await actual()).toBe(before);
  });

  it('are not taken back twice over: a reversal stays', async () => {
    const reversal = (await reverse((await add()).id)).body as JobCost;
    expect((await reverse(reversal.id)).status).toBe(409);
    expect((await reverse('01930000-0000-7000-8000-000000000001')).status).toBe(404);
  });

  it('refuse nothing, below nothing, days to come in the shop’s zone, and reasons left out', async () => {
    const status = async (fields: object) =>
      (await shop.owner.post(`/jobs/${jobId}/costs`, { ...cost, ...fields })).status;
    expect(await status({ amountCents: 0 })).toBe(422);
    expect(await status({ amountCents: -5 })).toBe(422);
    expect(await status({ category: 'wages' })).toBe(422);
    // It is June 2 in UTC and still June 1 in Chicago.
    expect(await status({ onDate: '2026-06-02' })).toBe(422);
    expect((await reverse((await add()).id, '  ')).status).toBe(422);
  });

  it('are for owner and bookkeeper only, and never change in the database', async () => {
    const bookkeeper = await shop.join('bookkeeper');
    const { id } = (await bookkeeper.client.post(`/jobs/${jobId}/costs`, cost)).body as JobCost;
    for (const role of ['crew', 'lead-hand'] as const) {
      const { client } = await shop.join(role);
      expect((await client.get(`/jobs/${jobId}/costs`)).status).toBe(403);
      expect((await client.post(`/jobs/${jobId}/costs`, cost)).status).toBe(403);
      expect((await reverse(id, 'No', client)).status).toBe(403);
    }
    await expect(
      api.platform.dataSource.query('update job_cost set amount_cents = 1 where id = ?', [id]),
    ).rejects.toThrow(/denied/);
    const stranger = await api.signUp();
    expect((await stranger.owner.get(`/jobs/${jobId}/costs`)).status).toBe(404);
    expect((await stranger.owner.post(`/jobs/${jobId}/costs`, cost)).status).toBe(404);
  });
});
