import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import customersRoutes from '../customers.routes';
import { buildCustomer, buildCustomerWithSites, buildSite } from '../testing/build-customer';

const routes = [{ path: 'customers', children: customersRoutes }];
const customer = buildCustomerWithSites({
  company: 'Wren LLC',
  taxExempt: true,
  exemptionCertificate: 'VT-1',
});
const path = `/customers/${customer.id}`;

async function open(role: 'owner' | 'lead-hand' = 'owner') {
  const screen = await openShopScreen(routes, path, buildMembership({ role }));
  screen.http.expectOne(screen.shop(path)).flush(customer);
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, press };
}

describe('CustomerDetail', () => {
  it('shows who it is, how they pay and where the work goes', async () => {
    const { element } = await open();
    expect(element.querySelector('h1')?.textContent).toBe('Tobias Wren');
    expect(element.textContent).toContain('Homeowner · Wren LLC · wren@example.test');
    expect(element.textContent).toContain('Exempt, certificate VT-1');
    expect(element.textContent).toContain('Main house');
  });

  it('archives after asking, and says so in its head', async () => {
    const { http, shop, press, loader, fixture, element } = await open();
    await press('Archive');
    const dialog = await loader.getHarness(MatDialogHarness);
    expect(await dialog.getTitleText()).toBe('Archive Tobias Wren?');
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'Archive' }))).click();
    http.expectOne(shop(`${path}/archive`)).flush(buildCustomer({ archivedAt: '2026-04-01T12:00:00Z' }));
    await fixture.whenStable();
    expect(element.querySelector('bm-page-head')?.textContent).toContain('Archived Wed, Apr 1');
  });

  it('adds a site in a dialog that stays open when the server refuses', async () => {
    const { http, shop, press, loader, element, fixture } = await open();
    await press('Add site');
    await (await loader.getAllHarnesses(MatInputHarness))[0]?.setValue('Lake cabin');
    await press('Save site');
    const refusal = {
      type: '',
      title: '',
      status: 422,
      code: 'invalid-input',
      detail: 'There is a site of this name.',
      fields: [{ path: 'name', message: 'Taken already.' }],
    };
    http.expectOne(shop(`${path}/sites`)).flush(refusal, { status: 422, statusText: '' });
    const dialog = await loader.getHarness(MatDialogHarness);
    expect(await dialog.getText()).toContain('Taken already.');
    await press('Save site');
    http
      .expectOne(shop(`${path}/sites`))
      .flush(buildSite({ id: '0190a1b2-0000-7000-8000-000000000051', name: 'Lake cabin' }));
    await fixture.whenStable();
    expect(await loader.getAllHarnesses(MatDialogHarness)).toHaveLength(0);
    expect(element.textContent).toContain('Lake cabin');
  });

  it('removes a site with the version it was read at', async () => {
    const { http, shop, press, loader, element, fixture } = await open();
    const menu = await loader.getHarness(MatMenuHarness);
    await menu.open();
    await menu.clickItem({ text: /Remove/ });
    await press('Remove');
    const request = http.expectOne(shop(`${path}/sites/${buildSite().id}`));
    expect(request.request.headers.get('If-Match')).toBe('"1"');
    request.flush(null, { status: 204, statusText: '' });
    await fixture.whenStable();
    expect(element.textContent).toContain('No sites yet');
  });

  it('lets those who only read change nothing', async () => {
    const { element } = await open('lead-hand');
    const actions = [...element.querySelectorAll('button, a[matbutton]')].map((each) =>
      each.textContent?.trim(),
    );
    expect(actions).toEqual([]);
  });
});
