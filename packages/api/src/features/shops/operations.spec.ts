import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('operations', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  const list = async (client = shop.owner) =>
    ((await client.get('/operations')).body as { rows: Operation[] }).rows;
  const reorder = (operationIds: string[]) => shop.owner.post('/operations/reorder', { operationIds });

  it('are there from the first day, in the order the work goes', async () => {
    const rows = await list();
    expect(rows[0]).toMatchObject({ name: 'Measure and draw', position: 1, onJob: true, archived: false });
    expect(rows.at(-1)).toMatchObject({ name: 'Shop, not on a job', onJob: false });
    expect(rows.map((row) => row.position)).toEqual(rows.map((_, index) => index + 1));
  });

  it('are added at the end, each name once', async () => {
    const added = await shop.owner.post('/operations', {
      name: 'Edge banding',
      defaultRateCentsPerHour: 5_200,
    });
    expect(added.body).toMatchObject({ costCategory: 'labor', onJob: true, defaultRateCentsPerHour: 5_200 });
    expect((await list()).at(-1)?.name).toBe('Edge banding');
    const again = await shop.owner.post('/operations', { name: 'edge banding' });
    expect(again.status).toBe(422);
    expect(again.body).toMatchObject({ fields: [{ path: 'name' }] });
    for (const wrong of [{ name: '' }, { name: 'X', costCategory: 'material' }, { name: 'X', position: 1 }])
      expect((await shop.owner.post('/operations', wrong)).status).toBe(422);
  });

  it('keep what was not sent, are archived and brought back, and refuse a version that has passed', async () => {
    const row = (await list())[1]!;
    const archived = await shop.owner.patch(`/operations/${row.id}`, { archived: true }, row.version);
    expect(archived.body).toMatchObject({ name: row.name, archived: true });
    expect((await shop.owner.patch(`/operations/${row.id}`, { archived: false }, row.version)).status).toBe(
      412,
    );
    const back = await shop.owner.patch(`/operations/${row.id}`, { archived: false }, row.version + 1);
    expect(back.body).toMatchObject({ archived: false, version: row.version + 2 });
  });

  it('are put in a new order only whole', async () => {
    const ids = (await list()).map((row) => row.id);
    const turned = await reorder(ids.toReversed());
    expect((turned.body as { rows: Operation[] }).rows.map((row) => row.id)).toEqual(ids.toReversed());
    expect((await list()).map((row) => row.id)).toEqual(ids.toReversed());
    expect((await reorder(ids.slice(1))).status).toBe(422);
    expect((await reorder([...ids.slice(1), ids[1]!])).status).toBe(422);
    const stranger = await api.signUp();
    const foreign = (await list(stranger.owner))[0]!.id;
    expect((await reorder([foreign, ...ids.slice(1)])).status).toBe(422);
    expect((await list()).map((row) => row.id)).toEqual(ids.toReversed());
  });

  it('come with the same places when two reorder at once', async () => {
    const ids = (await list()).map((row) => row.id);
    await Promise.all([reorder(ids.toReversed()), reorder(ids), reorder(ids.toReversed())]);
    expect((await list()).map((row) => row.position)).toEqual(ids.map((_, index) => index + 1));
  });

  it('show rates to who may see money, and change by the owner only', async () => {
    const row = (await list())[0]!;
    for (const role of ['crew', 'lead-hand', 'bookkeeper'] as const) {
      const { client } = await shop.join(role);
      const [first] = await list(client);
      expect(Object.hasOwn(first!, 'defaultRateCentsPerHour')).toBe(role === 'bookkeeper');
      expect((await client.post('/operations', { name: `By ${role}` })).status).toBe(403);
      expect((await client.patch(`/operations/${row.id}`, { name: 'X' }, row.version)).status).toBe(403);
      expect((await client.post('/operations/reorder', { operationIds: [row.id] })).status).toBe(403);
    }
  });
});
