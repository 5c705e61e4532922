import type { Client } from '../../../test/harness/client.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Listed = { id: string; current: boolean; userAgent: string; lastSeenAt: string };

describe('own sessions', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  const list = async (client: Client) =>
    ((await client.get('/api/account/sessions')).body as { rows: Listed[] }).rows;
  const isIn = async (client: Client) => (await client.get('/api/account/session')).status === 200;

  it('lists where the person is signed in, marks this one and hides session ids', async () => {
    const { client, email } = await shop.join('crew');
    api.clock.forward({ minutes: 5 });
    await api.signIn(email);
    const rows = await list(client);
    expect(rows.map(({ current }) => current)).toEqual([false, true]);
    expect(Object.keys(rows[0] ?? {}).sort()).toEqual([
      'address',
      'createdAt',
      'current',
      'id',
      'lastSeenAt',
      'userAgent',
    ]);
  });

  it('ends one of the own, and none of anybody else', async () => {
    const { client, email } = await shop.join('crew');
    const elsewhere = await api.signIn(email);
    const [other] = (await list(client)).filter(({ current }) => !current);
    const stranger = await shop.join('crew');
    const refused = await stranger.client.delete(`/api/account/sessions/${other?.id ?? ''}`);
    expect(refused.status).toBe(404);
    expect(await isIn(elsewhere)).toBe(true);
    expect((await client.delete(`/api/account/sessions/${other?.id ?? ''}`)).status).toBe(204);
    expect([await isIn(elsewhere), await isIn(client)]).toEqual([false, true]);
    expect((await client.delete(`/api/account/sessions/${other?.id ?? ''}`)).status).toBe(404);
    expect((await client.delete('/api/account/sessions/1e3')).status).toBe(404);
  });

  it('signs out here, and only here', async () => {
    const { client, email } = await shop.join('crew');
    const elsewhere = await api.signIn(email);
    const kept = client.copy();
    expect((await client.post('/api/account/sign-out')).status).toBe(204);
    expect([await isIn(client), await isIn(kept), await isIn(elsewhere)]).toEqual([false, false, true]);
  });

  it('signs out everywhere at once, and nobody else', async () => {
    const { client, email } = await shop.join('crew');
    const others = await Promise.all([1, 2, 3].map(() => api.signIn(email)));
    expect((await client.post('/api/account/sign-out-everywhere')).status).toBe(204);
    const still = await Promise.all([client, ...others].map(isIn));
    expect(still).toEqual([false, false, false, false]);
    expect(await isIn(shop.owner)).toBe(true);
  });
});
