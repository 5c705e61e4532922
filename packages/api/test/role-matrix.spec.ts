import { ROLES, type Role } from '@bookmatch/common/access/roles';
import { PREFIXES, type Route } from '../src/platform/http/route.js';
import type { Client } from './harness/client.js';
import { ROLE_MATRIX } from './role-matrix.js';
import { TestApi, type TestShop } from './harness/test-api.js';

const SOME_ID = '0193e000-0000-7000-8000-00000000abcd';
const nameOf = (route: Route) => `${route.method.toUpperCase()} ${route.path}`;

describe('who may do what', () => {
  let api: TestApi;
  let shop: TestShop;
  const clients = new Map<Role, Client>();
  beforeAll(async () => {
    api = await TestApi.open();
    shop = await api.signUp();
    clients.set('owner', shop.owner);
    for (const role of ROLES.filter((one) => one !== 'owner'))
      clients.set(role, (await shop.join(role)).client);
  });
  afterAll(() => api.close());

  const shopRoutes = () => api.product.routes.filter((route) => route.kind === 'shop');

  it('has a row for every route of a shop, and no row without a route', () => {
    expect(shopRoutes().map(nameOf).toSorted()).toEqual(Object.keys(ROLE_MATRIX).toSorted());
  });

  it.each(ROLES)('lets the %s do what the matrix says and refuses the rest with 403', async (role) => {
    const client = clients.get(role);
    const wrong: string[] = [];
    for (const route of shopRoutes()) {
      const address = PREFIXES.shop.replace(':shopId', shop.id) + route.path.replace(/:\w+/g, SOME_ID);
      const response =
        route.method === 'get'
          ? await client?.get(address)
          : await client?.send(
              route.method,
              address,
              { unknown: true },
              { key: `${role}-${nameOf(route)}`.replace(/\W/g, '-').slice(-60), version: 1 },
            );
      const mayPass = ROLE_MATRIX[nameOf(route)]?.includes(role) ?? false;
      if ((response?.status !== 403) !== mayPass) wrong.push(`${nameOf(route)}: ${response?.status}`);
      if ((response?.status ?? 500) >= 500) wrong.push(`${nameOf(route)}: ${response?.text}`);
    }
    expect(wrong).toEqual([]);
  });
});
