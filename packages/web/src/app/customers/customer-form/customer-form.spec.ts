import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { Router } from '@angular/router';
import { openShopScreen } from '../../testing/shop-screen';
import customersRoutes from '../customers.routes';
import { buildCustomer, buildCustomerWithSites } from '../testing/build-customer';

const routes = [{ path: 'customers', children: customersRoutes }];
const customer = buildCustomerWithSites({ phone: '(802) 555-0101' });
const path = `/customers/${customer.id}`;

async function open(url: string) {
  const screen = await openShopScreen(routes, url);
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const field = async (label: string) =>
    loader.getHarness(MatFormFieldHarness.with({ floatingLabelText: label }));
  const type = async (label: string, text: string) =>
    (await (await field(label)).getControl(MatInputHarness))?.setValue(text);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, field, type, press };
}

async function openEdit() {
  const screen = await open(`${path}/edit`);
  screen.http.expectOne(screen.shop(path)).flush(customer);
  await screen.fixture.whenStable();
  return screen;
}

/** By hand, since the harness waits for the navigation, which waits for this answer. */
async function stay(): Promise<void> {
  const button = () =>
    [...document.querySelectorAll('button')].find(({ textContent }) => textContent.trim() === 'Stay');
  while (!button()) await new Promise((resolve) => setTimeout(resolve));
  button()?.click();
}

describe('CustomerForm', () => {
  it('asks for nothing the server would refuse, and says so at the field', async () => {
    const { http, shop, press, type, field } = await open('/customers/new');
    await type('E-mail', 'nope');
    await press('Save customer');
    expect(await (await field('Name')).getTextErrors()).toEqual(['The name cannot be empty.']);
    expect(await (await field('E-mail')).getTextErrors()).toEqual(['This is not an e-mail address.']);
    http.expectNone(shop('/customers'));
  });

  it('adds a customer and opens it', async () => {
    const { http, shop, press, type, fixture } = await open('/customers/new');
    await type('Name', 'Tobias Wren');
    await press('Save customer');
    const request = http.expectOne(shop('/customers'));
    expect(request.request.body).toMatchObject({ kind: 'homeowner', name: 'Tobias Wren', taxExempt: false });
    request.flush(buildCustomer());
    await fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe(path);
  });

  it('changes a customer from the version that was read', async () => {
    const { http, shop, press, type } = await openEdit();
    await type('Phone', '(802) 555-0199');
    await press('Save customer');
    const { request } = http.expectOne({ url: shop(path), method: 'PATCH' });
    expect(request.headers.get('If-Match')).toBe('"1"');
    expect(request.body).toMatchObject({ phone: '(802) 555-0199', name: 'Tobias Wren' });
  });

  it('keeps what was typed in a conflict, tells what changed, and saves over it knowingly', async () => {
    const { http, shop, press, type, element, fixture, field } = await openEdit();
    await type('Phone', '(802) 555-0199');
    await press('Save customer');
    const stale = {
      type: '',
      title: '',
      status: 412,
      code: 'stale-version',
      detail: 'Somebody changed this.',
    };
    http.expectOne({ url: shop(path), method: 'PATCH' }).flush(stale, { status: 412, statusText: '' });
    http
      .expectOne({ url: shop(path), method: 'GET' })
      .flush({ ...customer, version: 2, company: 'Wren LLC' });
    await fixture.whenStable();
    expect(element.textContent).toContain('changed this meanwhile: company.');
    expect(await (await (await field('Phone')).getControl(MatInputHarness))?.getValue()).toBe(
      '(802) 555-0199',
    );
    await press('Save customer');
    const { request } = http.expectOne({ url: shop(path), method: 'PATCH' });
    expect(request.headers.get('If-Match')).toBe('"2"');
  });

  it('asks before leaving something typed behind, and not after it was saved', async () => {
    const { type, harness, http, shop, press, fixture } = await open('/customers/new');
    await type('Name', 'Tobias Wren');
    const leaving = TestBed.inject(Router).navigateByUrl('/customers');
    await stay();
    expect(await leaving).toBe(false);
    await press('Save customer');
    http.expectOne(shop('/customers')).flush(buildCustomer());
    await fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe(path);
    expect(harness.routeNativeElement?.tagName).toBe('BM-CUSTOMER-DETAIL');
  });
});
