import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe("the shop's settings", () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp({ shopName: 'Alder & Sons' });
  });
  afterAll(() => api.close());

  const read = async () => (await shop.owner.get('/shop')).body as { version: number; slug: string };

  it('start with what a shop can work by', async () => {
    const { body, headers } = await shop.owner.get('/shop');
    expect(headers['etag']).toBe('"1"');
    expect(body).toMatchObject({
      slug: 'alder-sons',
      currency: 'USD',
      defaultTaxRate: '0',
      invoiceDueDays: 14,
      cardPayments: 'not-set-up',
      defaultBillingSchedule: [{ name: 'Deposit', share: { percent: '40' }, deposit: true }, {}, {}],
    });
    expect(body).not.toHaveProperty('paymentAccountId');
  });

  it('change what is given and keep the rest, the slug above all', async () => {
    const { version } = await read();
    const changed = await shop.owner.patch(
      '/shop',
      { name: 'Alder Cabinets', defaultTaxRate: '0.0825' },
      version,
    );
    expect(changed.status).toBe(200);
    expect(changed.body).toMatchObject({
      version: version + 1,
      name: 'Alder Cabinets',
      slug: 'alder-sons',
      defaultTaxRate: '0.0825',
      timeZone: 'America/Chicago',
    });
    const session = await shop.owner.get('/api/account/session');
    expect(session.body).toMatchObject({ memberships: [{ shopName: 'Alder Cabinets', slug: 'alder-sons' }] });
  });

  it('of two edits of one version take the first', async () => {
    const { version } = await read();
    const answers = await Promise.all(
      ['555 0101', '555 0102'].map((phone) => shop.owner.patch('/shop', { phone }, version)),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
    expect((await shop.owner.send('patch', '/shop', { phone: '' })).status).toBe(428);
  });

  it.each([
    [{ slug: 'other' }, 'slug'],
    [{ currency: 'EUR' }, 'currency'],
    [{ paymentAccountId: 'acct_1' }, 'paymentAccountId'],
    [{ timeZone: 'Nowhere/Land' }, 'timeZone'],
    [{ defaultTaxRate: '1.5' }, 'defaultTaxRate'],
    [{ invoiceDueDays: 400 }, 'invoiceDueDays'],
    [{ name: '' }, 'name'],
    [{ defaultBillingSchedule: [] }, 'defaultBillingSchedule'],
  ])('refuse %j at its field', async (body, path) => {
    const answer = await shop.owner.patch('/shop', body, (await read()).version);
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ fields: [{ path }] });
  });

  it('take no default schedule that does not bill the whole price', async () => {
    const stage = { name: 'Deposit', share: { percent: '50' }, deposit: true, due: 'on-acceptance' };
    const { version } = await read();
    const refused = await shop.owner.patch('/shop', { defaultBillingSchedule: [stage] }, version);
    expect(refused.status).toBe(422);
    expect(refused.body).toMatchObject({ fields: [{ path: 'defaultBillingSchedule' }] });
    const rest = { name: 'Installed', share: { remainder: true }, deposit: false, due: 'by-hand' };
    const taken = await shop.owner.patch('/shop', { defaultBillingSchedule: [stage, rest] }, version);
    expect(taken.body).toMatchObject({ defaultBillingSchedule: [stage, rest] });
  });

  it('leave an audit row in the shop, with what stood there before', async () => {
    const before = (await read()) as { version: number; phone?: string };
    await shop.owner.patch('/shop', { phone: '555 0177' }, before.version);
    const rows: { before: string; after: string; person_id: string | null }[] =
      await api.platform.dataSource.query(
        "select * from audit_entry where shop_id = ? and table_name = 'shop' order by id desc limit 1",
        [shop.id],
      );
    expect(JSON.parse(rows[0]?.before ?? '')).toEqual({ phone: before.phone });
    expect(JSON.parse(rows[0]?.after ?? '')).toEqual({ phone: '555 0177' });
    expect(rows[0]?.person_id).not.toBeNull();
  });

  it('are read by owner and bookkeeper, changed by the owner alone', async () => {
    const { version } = await read();
    const seen: Record<string, number[]> = {};
    for (const role of ['bookkeeper', 'lead-hand', 'crew'] as const) {
      const { client } = await shop.join(role);
      const answers = [await client.get('/shop'), await client.patch('/shop', { name: 'Mine' }, version)];
      seen[role] = answers.map(({ status }) => status);
    }
    expect(seen).toEqual({ bookkeeper: [200, 403], 'lead-hand': [403, 403], crew: [403, 403] });
  });
});
