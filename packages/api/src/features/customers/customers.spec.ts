import { TestApi, type TestShop } from '../../../test/harness/test-api.js';

describe('customers', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
  });
  afterAll(() => api.close());

  const add = async (fields: object = {}) =>
    (await shop.owner.post('/customers', { kind: 'homeowner', name: 'Ines Calder', ...fields })).body as {
      id: string;
      version: number;
    };

  it('keeps what was typed and answers it with a version', async () => {
    const customer = await add({
      email: 'INES@Example.test',
      billingAddress: { street: '4 Quarry Road', city: 'Alder' },
    });
    const read = await shop.owner.get(`/customers/${customer.id}`);
    expect(read.status).toBe(200);
    expect(read.headers['etag']).toBe('"1"');
    expect(read.body).toMatchObject({
      name: 'Ines Calder',
      email: 'ines@example.test',
      billingAddress: { street: '4 Quarry Road', city: 'Alder', region: '' },
      sites: [],
    });
  });

  it('refuses unknown fields, wrong types and empty names with each field named', async () => {
    const answer = await shop.owner.post('/customers', { kind: 'plumber', name: ' ', shopId: shop.id });
    expect(answer.status).toBe(422);
    expect(answer.type).toBe('application/problem+json');
    const paths = (answer.body as { fields: { path: string }[] }).fields.map(({ path }) => path);
    expect(paths).toEqual(expect.arrayContaining(['kind', 'name', 'shopId']));
  });

  it('asks for the certificate of an exempt customer', async () => {
    const answer = await shop.owner.post('/customers', {
      kind: 'contractor',
      name: 'Exempt',
      taxExempt: true,
    });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ fields: [{ path: 'exemptionCertificate' }] });
  });

  it('answers a repeated request with the first answer and makes one customer', async () => {
    const body = { kind: 'homeowner', name: 'Only Once' };
    const answers = await Promise.all(
      Array.from({ length: 8 }, () => shop.owner.post('/customers', body, { key: 'one-and-the-same' })),
    );
    expect(new Set(answers.map(({ body }) => (body as { id: string }).id)).size).toBe(1);
    const other = await shop.owner.post(
      '/customers',
      { ...body, name: 'Other' },
      { key: 'one-and-the-same' },
    );
    expect(other.status).toBe(422);
    const list = await shop.owner.get('/customers', { q: 'Only Once' });
    expect(list.body).toMatchObject({ total: 1 });
  });

  it('refuses a change without a version, and one of a version that has passed', async () => {
    const { id } = await add();
    const body = { kind: 'designer', name: 'Changed' };
    expect((await shop.owner.send('patch', `/customers/${id}`, body)).status).toBe(428);
    expect((await shop.owner.patch(`/customers/${id}`, body, 1)).status).toBe(200);
    const stale = await shop.owner.patch(`/customers/${id}`, { ...body, name: 'Again' }, 1);
    expect(stale.status).toBe(412);
    expect(stale.body).toMatchObject({ code: 'stale-version', facts: { version: 2 } });
  });

  it('pages by keyset without losing or repeating a row, in both directions', async () => {
    for (const name of ['Page A', 'Page A', 'Page B', 'Page C', 'Page D']) await add({ name });
    for (const sort of ['name', '-name', 'createdAt', '-createdAt']) {
      const seen: string[] = [];
      let after: string | undefined;
      do {
        const { body } = await shop.owner.get('/customers', {
          q: 'Page',
          sort,
          limit: '2',
          ...(after ? { after } : {}),
        });
        const page = body as { rows: { id: string }[]; next: string | null };
        seen.push(...page.rows.map(({ id }) => id));
        after = page.next ?? undefined;
      } while (after);
      expect(seen).toHaveLength(5);
      expect(new Set(seen).size).toBe(5);
    }
  });

  it('takes % and _ in a search as themselves, and refuses an unknown sort', async () => {
    await add({ name: '100% linseed' });
    expect((await shop.owner.get('/customers', { q: '100%' })).body).toMatchObject({ total: 1 });
    expect((await shop.owner.get('/customers', { q: '1__%' })).body).toMatchObject({ total: 0 });
    expect((await shop.owner.get('/customers', { sort: 'name;drop table customer' })).status).toBe(400);
    expect((await shop.owner.get('/customers', { sort: 'shopId' })).status).toBe(400);
  });

  it('leaves an audit row for each change, with what stood there before', async () => {
    const { id } = await add({ phone: '555 0100' });
    await shop.owner.patch(
      `/customers/${id}`,
      { kind: 'homeowner', name: 'Ines Calder', phone: '555 0199' },
      1,
    );
    const rows: { action: string; before: string | null; after: string }[] =
      await api.platform.dataSource.query(
        'select action, `before`, `after` from audit_entry where row_id = ? order by id',
        [id],
      );
    expect(rows.map(({ action }) => action)).toEqual(['insert', 'update']);
    expect(JSON.parse(rows[1]?.before ?? '')).toEqual({ phone: '555 0100' });
    await expect(
      api.platform.dataSource.query('update audit_entry set actor = ?', ['nobody']),
    ).rejects.toThrow(/denied/);
    await expect(api.platform.dataSource.query('drop table customer')).rejects.toThrow(/denied/);
  });

  it('keeps sites with their customer', async () => {
    const { id } = await add();
    const other = await add({ name: 'Somebody else' });
    const site = (await shop.owner.post(`/customers/${id}/sites`, { name: 'Lake house' })).body as {
      id: string;
    };
    expect(
      (await shop.owner.patch(`/customers/${other.id}/sites/${site.id}`, { name: 'Moved' }, 1)).status,
    ).toBe(404);
    expect(
      (await shop.owner.patch(`/customers/${id}/sites/${site.id}`, { name: 'Boat house' }, 1)).status,
    ).toBe(200);
    expect((await shop.owner.delete(`/customers/${id}/sites/${site.id}`, 2)).status).toBe(204);
  });

  it('answers 404 to a stranger, 403 to a role without the right, 401 to nobody', async () => {
    const { id } = await add();
    const stranger = await api.signUp();
    const inShop = stranger.owner.below(`/api/shops/${shop.id}`);
    expect((await inShop.get(`/customers/${id}`)).status).toBe(404);
    expect((await stranger.owner.get(`/customers/${id}`)).status).toBe(404);
    const { client: crew } = await shop.join('crew');
    expect((await crew.get('/customers')).status).toBe(403);
    expect((await api.browser().get(`/shops/${shop.id}/customers`)).status).toBe(401);
    expect((await shop.owner.get('/customers/1e3')).status).toBe(404);
  });
});
