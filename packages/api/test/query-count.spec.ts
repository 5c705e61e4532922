import { PREFIXES, type Route } from '../src/platform/http/route.js';
import { makeRows } from './body-id-cases.js';
import { QueryNoter } from './harness/query-noter.js';
import { TestApi, type TestShop } from './harness/test-api.js';

/** Session, member with shop, rows, and what hangs on the rows. The total is a fourth where there is more than a page. */
const MOST_QUERIES = 4;

const isList = (route: Route) =>
  route.kind === 'shop' &&
  route.method === 'get' &&
  route.query !== undefined &&
  'limit' in shapeOf(route.query);
const shapeOf = (schema: unknown) => (schema as { shape?: object }).shape ?? {};

describe('list routes', () => {
  let api: TestApi;
  let shop: TestShop;
  let noter: QueryNoter;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    await makeRows(shop.owner, (await shop.join('crew')).memberId);
    noter = new QueryNoter(api);
  });
  afterAll(() => api.close());

  it(`need at most ${MOST_QUERIES} queries, session and total included, however many rows`, async () => {
    const counts: Record<string, number> = {};
    for (const route of api.product.routes.filter(isList)) {
      const address = PREFIXES.shop.replace(':shopId', shop.id) + route.path;
      if (address.includes(':')) continue;
      const seen = await noter.during(async () => {
        expect([route.path, (await shop.owner.get(address)).status]).toEqual([route.path, 200]);
      });
      counts[route.path] = seen.length;
    }
    expect(Object.keys(counts).length).toBeGreaterThan(5);
    expect(Object.entries(counts).filter(([, count]) => count > MOST_QUERIES)).toEqual([]);
    expect(counts['/customers']).toBe(3);
  });

  it('reads every tenant table through an index that starts with the shop', async () => {
    const full: string[] = [];
    for (const route of api.product.routes.filter(isList)) {
      const address = PREFIXES.shop.replace(':shopId', shop.id) + route.path;
      if (address.includes(':')) continue;
      const seen = await noter.during(() => shop.owner.get(address));
      const selects = seen.filter((query) => /^select/i.test(query) && /shop_id/i.test(query));
      for (const query of selects) {
        const values = Array.from({ length: (query.match(/\?/g) ?? []).length }, () => shop.id);
        const plan = await api.platform.dataSource.query<
          { table: string; type: string; key: string | null }[]
        >(`explain ${query}`, values);
        full.push(
          ...plan
            .filter(({ type }) => type === 'ALL' || type === 'index')
            .map(({ table }) => `${route.path}: ${table}`),
        );
      }
    }
    expect(full).toEqual([]);
  });
});
