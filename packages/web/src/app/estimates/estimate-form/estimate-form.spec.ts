import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { buildEstimate } from '@bookmatch/common/testing/build-estimate';
import { buildCustomer, buildSite } from '@bookmatch/common/testing/build-customer';
import { openShopScreen } from '../../testing/shop-screen';
import estimatesRoutes from '../estimates.routes';

const routes = [{ path: 'estimates', children: estimatesRoutes }];
const customer = buildCustomer({ name: 'Tobias Wren' });
const site = buildSite({ customerId: customer.id, name: 'Main house' });

async function open(url: string) {
  const screen = await openShopScreen(routes, url);
  const { fixture, element } = screen;
  const submit = async () => {
    element.querySelector<HTMLButtonElement>('button[type=submit]')!.click();
    await fixture.whenStable();
  };
  const type = async (selector: string, text: string) => {
    const field = element.querySelector<HTMLInputElement>(selector)!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  return { ...screen, submit, type };
}

describe('EstimateForm', () => {
  it('asks for a title and a customer', async () => {
    const { submit, element, http, shop } = await open('/estimates/new');
    await submit();
    expect(element.textContent).toContain('The title cannot be empty.');
    expect(element.textContent).toContain('Choose a customer from the list.');
    http.expectNone(shop('/estimates'));
  });

  it('starts an estimate for the customer of the address, at their only site, and opens it', async () => {
    const { submit, type, http, shop, fixture } = await open(`/estimates/new?customerId=${customer.id}`);
    http.expectOne(shop(`/customers/${customer.id}`)).flush({ ...customer, sites: [site] });
    await type('input[formControlName=title]', 'Library wall');
    await submit();
    const call = http.expectOne({ method: 'POST', url: shop('/estimates') });
    expect(call.request.body).toEqual({
      ...{ title: 'Library wall', customerId: customer.id, siteId: site.id, leadId: null },
    });
    const estimate = buildEstimate();
    call.flush(estimate);
    await fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe(`/estimates/${estimate.id}`);
  });
});
