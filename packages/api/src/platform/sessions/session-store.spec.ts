import type { SessionData } from 'express-session';
import type { Client } from '../../../test/harness/client.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Row = { sid: string; expires: Date; last_seen_at: Date; data: string };

describe('the session store', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  const isIn = async (client: Client) => (await client.get('/api/account/session')).status === 200;
  const rowsOf = (personId: string): Promise<Row[]> =>
    api.platform.dataSource.query('select * from session where person_id = ?', [personId]);
  const rowOf = async (personId: string) => {
    const [row] = await rowsOf(personId);
    if (!row) throw new Error('There is no session.');
    return row;
  };
  const store = () => api.platform.sessions;
  const load = (sid: string) =>
    new Promise<SessionData | null>((resolve, reject) => {
      store().get(sid, (error, data) => (error ? reject(error as Error) : resolve(data ?? null)));
    });
  const finish = (act: (done: (error?: unknown) => void) => void) =>
    new Promise<void>((resolve, reject) => {
      act((error) => (error ? reject(error as Error) : resolve()));
    });

  it('writes no row for a browser nobody signed in at', async () => {
    const count = async () => {
      const [row]: { total: string }[] = await api.platform.dataSource.query(
        'select count(*) as total from session',
      );
      return Number(row?.total);
    };
    const before = await count();
    const browser = api.browser();
    await browser.get('/account/session');
    await browser.post('/account/sign-in', { email: 'nobody@nowhere.test', password: 'whatever it is' });
    expect(await count()).toBe(before);
  });

  it('keeps only the hash of the id, and only ids in the data', async () => {
    const { client, personId } = await shop.join('crew');
    const row = await rowOf(personId);
    const cookie = decodeURIComponent(client.cookie('bookmatch') ?? '');
    const sid = /^s:([^.]+)\./.exec(cookie)?.[1] ?? '';
    expect(sid.length).toBeGreaterThan(20);
    expect(JSON.stringify(row)).not.toContain(sid);
    expect(Object.keys(JSON.parse(row.data) as object).sort()).toEqual(['cookie', 'personId', 'seenAt']);
  });

  it('gives a new id at sign-in: one that was planted stays worthless', async () => {
    const { email } = await shop.join('crew');
    const browser = await api.signIn(email);
    const planted = browser.copy();
    const { status } = await browser.post('/account/sign-in', { email, password: 'plenty of sawdust' });
    expect(status).toBe(200);
    expect(browser.cookie('bookmatch')).not.toBe(planted.cookie('bookmatch'));
    expect([await isIn(browser), await isIn(planted)]).toEqual([true, false]);
  });

  it('takes no id that it did not give out itself', async () => {
    const { client } = await shop.join('crew');
    const forged = api.browser();
    forged.setCookie('bookmatch', (client.cookie('bookmatch') ?? '').replace(/\.[^.]+$/, '.forged'));
    expect(await isIn(forged)).toBe(false);
  });

  it('does not sign in from a row that expired, though it still stands there', async () => {
    const { client, personId } = await shop.join('crew');
    api.clock.forward({ days: 15 });
    expect(await rowsOf(personId)).toHaveLength(1);
    expect(await isIn(client)).toBe(false);
  });

  it('lives on while it is used, but no longer than thirty days', async () => {
    const { client } = await shop.join('crew');
    for (const days of [10, 10, 9]) {
      api.clock.forward({ days });
      expect(await isIn(client)).toBe(true);
    }
    api.clock.forward({ days: 2 });
    expect(await isIn(client)).toBe(false);
  });

  it('writes at most once a minute', async () => {
    const { client, personId } = await shop.join('crew');
    const first = await rowOf(personId);
    api.clock.forward({ minutes: 0.5 });
    await isIn(client);
    expect((await rowOf(personId)).last_seen_at).toEqual(first.last_seen_at);
    api.clock.forward({ minutes: 1 });
    await isIn(client);
    const touched = await rowOf(personId);
    expect(touched.last_seen_at.getTime()).toBeGreaterThan(first.last_seen_at.getTime());
    expect(touched.expires.getTime()).toBeGreaterThan(first.expires.getTime());
    api.clock.forward({ minutes: 0.5 });
    await isIn(client);
    expect((await rowOf(personId)).last_seen_at).toEqual(touched.last_seen_at);
  });

  it('is not brought back by a request that was in flight when it ended', async () => {
    const { client, personId } = await shop.join('crew');
    const sid = /^s:([^.]+)\./.exec(decodeURIComponent(client.cookie('bookmatch') ?? ''))?.[1] ?? '';
    const inFlight = await load(sid);
    if (!inFlight) throw new Error('The session should be there.');
    await finish((done) => store().destroy(sid, done));
    api.clock.forward({ minutes: 5 });
    await finish((done) => store().touch(sid, inFlight, done));
    await finish((done) => store().set(sid, inFlight, done));
    expect(await rowsOf(personId)).toEqual([]);
    expect(await load(sid)).toBeNull();
  });

  it('ends with a sign-out while twenty requests of it are under way', async () => {
    const { client, personId } = await shop.join('crew');
    api.clock.forward({ minutes: 5 });
    const copy = client.copy();
    await Promise.all([
      client.post('/api/account/sign-out'),
      ...Array.from({ length: 20 }, () => copy.get('/api/account/session')),
    ]);
    expect(await isIn(copy)).toBe(false);
    expect(await rowsOf(personId)).toEqual([]);
  });
});
