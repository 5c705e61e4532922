import { PASSWORD, TestApi, type TestShop } from '../../../test/harness/test-api.js';

const wrong = (email: string) => ({ email, password: 'not the password' });

describe('guessing passwords', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open({ limitScale: 1 });
    shop = await api.signUp();
  });
  afterAll(() => api.close());
  // Each test starts with fresh counters; they live in the database, so that all processes share them.
  beforeEach(() => api.platform.dataSource.query('delete from rate_limit'));

  const guess = (email: string, headers: Record<string, string> = {}) =>
    api.browser().post('/account/sign-in', wrong(email), { headers });
  const statuses = async (count: number, of: (n: number) => Promise<{ status: number }>) => {
    const seen: number[] = [];
    for (let n = 0; n < count; n += 1) seen.push((await of(n)).status);
    return seen;
  };

  it('is stopped after ten tries on an account, with the wait said', async () => {
    const { email } = await shop.join('crew');
    expect(await statuses(10, () => guess(email))).toEqual(Array(10).fill(401));
    const refused = await guess(email);
    expect(refused.status).toBe(429);
    const wait = Number(refused.headers['retry-after']);
    expect(wait).toBeGreaterThan(0);
    expect(wait).toBeLessThanOrEqual(15 * 60);
    expect((await api.browser().post('/account/sign-in', { email, password: PASSWORD })).status).toBe(429);
  });

  it('is stopped the same for an account that does not exist', async () => {
    const seen = await statuses(11, () => guess('nobody@nowhere.test'));
    expect(seen).toEqual([...Array<number>(10).fill(401), 429]);
  });

  it('is not helped by forged forwarding headers', async () => {
    const { email } = await shop.join('crew');
    const seen = await statuses(11, (n) =>
      guess(email, { 'X-Forwarded-For': `203.0.113.${n}`, Forwarded: `for=198.51.100.${n}` }),
    );
    expect(seen.at(-1)).toBe(429);
  });

  it('is stopped across accounts from one address', async () => {
    const seen = await statuses(101, (n) => guess(`account${n}@nowhere.test`));
    expect(seen.slice(0, 100).every((status) => status === 401)).toBe(true);
    expect(seen.at(-1)).toBe(429);
  });

  it('locks nobody out for good: the wait passes, and a success takes the tries back', async () => {
    const { email } = await shop.join('crew');
    await statuses(11, () => guess(email));
    await api.platform.dataSource.query('update rate_limit set expire = 1');
    await api.signIn(email);
    const rounds = await statuses(24, async (n) =>
      n % 8 === 7 ? api.browser().post('/account/sign-in', { email, password: PASSWORD }) : guess(email),
    );
    expect(rounds).not.toContain(429);
  });

  it('counts wrong current passwords of somebody signed in', async () => {
    const { client } = await shop.join('crew');
    await api.platform.dataSource.query('delete from rate_limit');
    const body = { currentPassword: 'not the password', newPassword: 'long enough to be one' };
    const seen = await statuses(11, () => client.post('/api/account/change-password', body));
    expect(seen).toEqual([...Array<number>(10).fill(422), 429]);
  });

  it('does not flood a mailbox: five letters an hour to one address', async () => {
    const { email } = await shop.join('crew');
    const ask = () => api.browser().post('/account/request-password-reset', { email });
    expect(await statuses(6, ask)).toEqual([202, 202, 202, 202, 202, 429]);
    expect(await api.lettersTo(email)).toHaveLength(5);
  });

  it('takes as long for an unknown address as for a wrong password', async () => {
    const { email } = await shop.join('crew');
    const took = { known: [] as number[], unknown: [] as number[] };
    for (let round = 0; round < 12; round += 1) {
      for (const [kind, address] of [
        ['known', email],
        ['unknown', `nobody${round}@nowhere.test`],
      ] as const) {
        await api.platform.dataSource.query('delete from rate_limit');
        const browser = api.browser();
        await browser.get('/openapi.json');
        // This process's own work, since the time on the wall also holds what others do on the machine.
        const start = process.cpuUsage();
        await browser.post('/account/sign-in', wrong(address));
        const { user, system } = process.cpuUsage(start);
        took[kind].push(user + system);
      }
    }
    const median = (times: number[]) => times.sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? 0;
    const ratio = median(took.unknown) / median(took.known);
    // Without the decoy hash an unknown address answers several times faster.
    expect(ratio).toBeGreaterThan(0.6);
    expect(ratio).toBeLessThan(1.7);
  });
});
