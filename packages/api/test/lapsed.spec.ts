import type { Route } from '../src/platform/http/route.js';
import { writes } from '../src/platform/http/route.js';
import { TestApi, type TestShop } from './harness/test-api.js';

const SOME_ID = '0193e000-0000-7000-8000-00000000abcd';
/** The only things a shop that has lapsed can still do. */
const STILL_OPEN = [
  'delete /members/:id',
  'post /subscription/checkout',
  'post /subscription/portal',
  'post /subscription/refresh',
];

describe('a shop whose subscription has lapsed', () => {
  let api: TestApi;
  let shop: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    await api.platform.dataSource.query("update subscription set status = 'canceled' where shop_id = ?", [
      shop.id,
    ]);
  });
  afterAll(() => api.close());

  const shopRoutes = () => api.product.routes.filter(({ kind }) => kind === 'shop');
  const nameOf = ({ method, path }: Route) => `${method} ${path}`;
  const codeFrom = async (route: Route) => {
    const address = route.path.replace(/:\w+/g, SOME_ID);
    const response = writes(route)
      ? await shop.owner.send(route.method as 'post', address, {}, { key: 'lapsed-shop-1', version: 1 })
      : await shop.owner.get(address);
    return (response.body as { code?: string } | undefined)?.code ?? String(response.status);
  };

  it('can read and export everything: no GET of any route is closed', async () => {
    const reads = shopRoutes().filter((route) => !writes(route));
    expect(reads.filter(({ path }) => /export|csv|pdf/.test(path)).length).toBeGreaterThan(0);
    for (const route of reads)
      expect([nameOf(route), await codeFrom(route)]).not.toEqual([nameOf(route), 'subscription-lapsed']);
  });

  it('can write nothing but what leads back, and who is locked out', async () => {
    const changes = shopRoutes().filter(writes);
    expect(changes.length).toBeGreaterThan(30);
    const open: string[] = [];
    for (const route of changes)
      if ((await codeFrom(route)) !== 'subscription-lapsed') open.push(nameOf(route));
    expect(open.sort()).toEqual(STILL_OPEN);
  });

  it('still lets its people sign in and out, and open another shop', async () => {
    const session = await shop.owner.get('/api/account/session');
    expect(session.body).toMatchObject({
      memberships: [{ subscription: { access: 'read-only', banner: 'read-only', daysLeft: null } }],
    });
    const another = { shopName: 'Another', timeZone: 'America/Chicago', unitSystem: 'inch' };
    expect((await shop.owner.post('/api/account/shops', another)).status).toBe(201);
  });
});
