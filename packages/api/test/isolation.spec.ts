import { TestApi, type TestShop } from './harness/test-api.js';
import type { Route } from '../src/platform/http/route.js';

const SOME_ID = '0193e000-0000-7000-8000-00000000abcd';
const shopRoutes = (api: TestApi) => api.product.routes.filter((route) => route.kind === 'shop');
const addressOf = (route: Route, shopId: string) =>
  `/api/shops/${shopId}${route.path.replace(/:\w+/g, SOME_ID)}`;

describe('the wall between shops', () => {
  let api: TestApi;
  let shop: TestShop;
  let stranger: TestShop;
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    stranger = await api.signUp();
  });
  afterAll(() => api.close());

  it('answers every route of a shop with 404 to the owner of another', async () => {
    const answers: string[] = [];
    for (const route of shopRoutes(api)) {
      const address = addressOf(route, shop.id);
      const response =
        route.method === 'get'
          ? await stranger.owner.get(address)
          : await stranger.owner.send(route.method, address, {}, { key: 'some-key-0001', version: 1 });
      if (response.status !== 404) answers.push(`${route.method} ${route.path}: ${response.status}`);
    }
    expect(shopRoutes(api).length).toBeGreaterThan(8);
    expect(answers).toEqual([]);
  });

  it('answers the same for a shop that does not exist', async () => {
    const [known, unknown] = await Promise.all(
      [shop.id, SOME_ID].map((id) => stranger.owner.get(`/api/shops/${id}/customers`)),
    );
    const { reference: _one, ...first } = known?.body as Record<string, unknown>;
    const { reference: _two, ...second } = unknown?.body as Record<string, unknown>;
    expect(first).toEqual(second);
  });

  it('answers every route of a shop with 401 to nobody', async () => {
    const answers: string[] = [];
    for (const route of shopRoutes(api)) {
      const browser = api.browser();
      const address = addressOf(route, shop.id);
      const response =
        route.method === 'get'
          ? await browser.get(address)
          : await browser.send(route.method, address, {}, { key: 'some-key-0002', version: 1 });
      if (response.status !== 401) answers.push(`${route.method} ${route.path}: ${response.status}`);
    }
    expect(answers).toEqual([]);
  });

  it('answers ids that are no ids like ids that do not exist', async () => {
    for (const route of shopRoutes(api).filter(({ path }) => path.includes(':')))
      for (const bad of ['1e3', 'null', `${SOME_ID}'`, '%00', '0']) {
        const address = `/api/shops/${shop.id}${route.path.replace(/:\w+/g, bad)}`;
        const response =
          route.method === 'get'
            ? await shop.owner.get(address)
            : await shop.owner.send(route.method, address, {}, { key: 'some-key-0003', version: 1 });
        expect([route.method, address, response.status < 500 && response.status >= 400]).toEqual([
          route.method,
          address,
          true,
        ]);
      }
  });
});
