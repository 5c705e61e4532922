import { Provider } from '../../../test/harness/provider.js';
import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

type Made = { id: string; metadata: { shopId?: string } };

describe('card payments of a shop', () => {
  let api: TestApi;
  let provider: Provider;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open({ now: new Date().toISOString() });
    provider = new Provider(api);
  });
  afterAll(() => api.close());
  beforeEach(async () => {
    shop = await api.signUp();
  });

  const setUp = async () => (await shop.owner.post('/shop/card-payments')).body as { url: string };
  const status = async () => ((await shop.owner.get('/shop')).body as { cardPayments: string }).cardPayments;
  const accountId = async () => {
    const rows: { id: string | null }[] = await api.platform.dataSource.query(
      'select payment_account_id as id from shop where id = ?',
      [shop.id],
    );
    return rows[0]?.id ?? '';
  };
  const complete = (url: string, action = 'complete') =>
    provider.submit(url, { action, business_name: 'Juniper Cabinet Works' });
  const updates = async () => {
    const query = `type=account.updated&object=${await accountId()}`;
    return ((await provider.control('GET', `/events?${query}`)) as { events: { id: string }[] }).events;
  };

  it("are opened on the provider's page and ready once its word came", async () => {
    expect(await status()).toBe('not-set-up');
    const { url } = await setUp();
    expect(await status()).toBe('in-progress');
    const back = await complete(url);
    expect(back).toBe(`${api.platform.config.origin}/s/${shop.slug}/settings/card-payments?from=provider`);
    await provider.settle();
    expect(await status()).toBe('ready');
    expect((await shop.owner.post('/shop/card-payments')).status).toBe(409);
  });

  it('stay in progress while the provider looks them over, and go back when it closes them', async () => {
    await complete((await setUp()).url, 'review');
    await provider.settle();
    expect(await status()).toBe('in-progress');
    const standing = `/accounts/${await accountId()}/standing`;
    await provider.control('POST', standing, { enabled: true });
    await provider.settle();
    expect(await status()).toBe('ready');
    await provider.control('POST', standing, { enabled: false });
    await provider.settle();
    expect(await status()).toBe('in-progress');
    expect((await shop.owner.post('/shop/card-payments')).status).toBe(200);
  });

  it('make one account, however often and at once it is clicked', async () => {
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => shop.owner.post('/shop/card-payments')),
    );
    expect(new Set(answers.map(({ status: code }) => code))).toEqual(new Set([200]));
    const made: Made[] = await Promise.all([api.platform.payments.accounts.retrieve(await accountId())]).then(
      (accounts) => accounts as unknown as Made[],
    );
    expect(made[0]?.metadata.shopId).toBe(shop.id);
    await complete((await setUp()).url);
    await provider.settle();
    expect(await status()).toBe('ready');
  });

  it('are not made twice when the answer of the provider was lost on the way', async () => {
    const lost = { kind: 'reset-after', calls: 2, method: 'POST', path: '/v1/accounts' };
    await provider.control('POST', '/faults', lost);
    await shop.owner.post('/shop/card-payments');
    await provider.control('DELETE', '/faults');
    await setUp();
    const first = await accountId();
    // What a second process would do that died before it stored the id: the same key gives the same account.
    await api.platform.dataSource.query(
      "update shop set payment_account_id = null, card_payments = 'not-set-up' where id = ?",
      [shop.id],
    );
    await setUp();
    expect(await accountId()).toBe(first);
  });

  it('find their shop by the account itself when its id was never stored', async () => {
    const { url } = await setUp();
    const id = await accountId();
    await api.platform.dataSource.query(
      "update shop set payment_account_id = null, card_payments = 'not-set-up' where id = ?",
      [shop.id],
    );
    await complete(url);
    await provider.settle();
    expect([await accountId(), await status()]).toEqual([id, 'ready']);
  });

  it('say so when the provider is away, and change nothing', async () => {
    await provider.control('POST', '/faults', { kind: 'error-before', calls: 6, path: '/v1/accounts' });
    const answer = await shop.owner.post('/shop/card-payments');
    await provider.control('DELETE', '/faults');
    expect(answer.status).toBe(503);
    expect(answer.body).toMatchObject({ code: 'not-ready' });
    expect(await status()).toBe('not-set-up');
  });

  it('end with the last word of the provider when its events come late, twice and in reverse', async () => {
    const { url } = await setUp();
    await provider.control('PUT', '/delivery', { mode: 'hold' });
    await complete(url);
    const standing = `/accounts/${await accountId()}/standing`;
    await provider.control('POST', standing, { enabled: false });
    await provider.control('POST', standing, { enabled: true });
    await provider.control('PUT', '/delivery', { mode: 'normal' });
    await provider.settle('reverse');
    const [first] = await updates();
    await provider.control('POST', `/events/${first?.id ?? ''}/resend`, { copies: 20, parallel: true });
    await provider.settle();
    expect(await status()).toBe('ready');
  });

  it('take no forged, changed, old or future word', async () => {
    await complete((await setUp()).url);
    await provider.settle();
    const [event] = await updates();
    const resend = async (how: object) =>
      ((await provider.control('POST', `/events/${event?.id ?? ''}/resend`, how)) as { statuses: number[] })
        .statuses;
    expect(await resend({ secret: 'whsec_of_somebody_else' })).toEqual([400]);
    expect(await resend({ tampered: true })).toEqual([400]);
    expect(await resend({ signedSecondsAgo: 400 })).toEqual([400]);
    expect(await resend({ signedSecondsAgo: -400 })).toEqual([400]);
    expect(await resend({})).toEqual([200]);
  });

  it('are asked for afresh on the way back from the provider, without waiting for its word', async () => {
    await provider.control('PUT', '/delivery', { mode: 'drop' });
    await complete((await setUp()).url);
    await provider.control('PUT', '/delivery', { mode: 'normal' });
    expect(await status()).toBe('in-progress');
    expect((await shop.owner.post('/shop/card-payments/refresh')).body).toMatchObject({
      cardPayments: 'ready',
    });
  });

  it('do not make a form of the settings stale', async () => {
    const { body } = await shop.owner.get('/shop');
    await complete((await setUp()).url);
    await provider.settle();
    const { version } = body as { version: number };
    expect((await shop.owner.patch('/shop', { phone: '555 0123' }, version)).status).toBe(200);
  });

  it('are set up by an owner alone', async () => {
    for (const role of ['bookkeeper', 'lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      expect((await client.post('/shop/card-payments')).status).toBe(403);
      expect((await client.post('/shop/card-payments/refresh')).status).toBe(403);
    }
    const stranger = await api.signUp();
    const inShop = stranger.owner.below(`/api/shops/${shop.id}`);
    expect((await inShop.post('/shop/card-payments')).status).toBe(404);
  });
});
