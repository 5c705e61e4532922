import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { DataTableHarness } from '../../ui/data-table/data-table.harness';
import customersRoutes from '../customers.routes';
import { buildCustomerRow } from '../testing/build-customer';

const routes = [{ path: 'customers', children: customersRoutes }];

async function open(url = '/customers', membership = buildMembership()) {
  const screen = await openShopScreen(routes, url, membership);
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  return { ...screen, table: await loader.getHarness(DataTableHarness) };
}

describe('CustomerList', () => {
  it('asks for what the address says and shows the answer', async () => {
    const { http, shop, table } = await open('/customers?q=wren&kind=homeowner&sort=-createdAt');
    const row = buildCustomerRow({ company: 'Wren LLC', phone: '(802) 555-0101' });
    http
      .expectOne(shop('/customers?q=wren&sort=-createdAt&kind=homeowner'))
      .flush({ rows: [row], next: null, total: 1 });
    const [cells] = await table.cellTexts();
    expect(cells?.slice(0, 4)).toEqual(['Tobias Wren Wren LLC', 'Homeowner', 'Stowe', '(802) 555-0101']);
  });

  it('asks again in another order, and keeps it in the address', async () => {
    const { http, shop, table } = await open();
    http.expectOne(shop('/customers')).flush({ rows: [buildCustomerRow()], next: null, total: 1 });
    await table.sortBy('Added');
    http.expectOne(shop('/customers?sort=createdAt')).flush({ rows: [], next: null, total: 0 });
    expect(TestBed.inject(Router).url).toBe('/customers?sort=createdAt');
  });

  it('asks once more when the first try failed', async () => {
    const { http, shop, table } = await open();
    http.expectOne(shop('/customers')).flush('', { status: 500, statusText: '' });
    await table.press('Try again');
    http.expectOne(shop('/customers')).flush({ rows: [buildCustomerRow()], next: null, total: 1 });
    expect(await table.rowCount()).toBe(1);
  });

  it('offers adding only to those who may', async () => {
    const offers = async (membership: Membership) => {
      TestBed.resetTestingModule();
      return (await open('/customers', membership)).element.textContent?.includes('Add customer');
    };
    const lapsed = { access: 'read-only', banner: 'read-only', daysLeft: null } as const;
    expect(await offers(buildMembership())).toBe(true);
    expect(await offers(buildMembership({ role: 'lead-hand' }))).toBe(false);
    expect(await offers(buildMembership({ subscription: lapsed }))).toBe(false);
  });
});
