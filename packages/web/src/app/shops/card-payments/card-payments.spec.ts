import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { PageLoad } from '../../platform/session/page-load';
import { openShopScreen } from '../../testing/shop-screen';
import { buildMembership } from '../../testing/session';
import shopsRoutes from '../shops.routes';
import { buildShop } from '../testing/build-shop';

const routes = [{ path: 'settings', children: shopsRoutes }];

async function open(query = '', cardPayments: 'not-set-up' | 'in-progress' | 'ready' = 'not-set-up') {
  const go = jest.fn();
  const page = { provide: PageLoad, useValue: { go } };
  const path = `/settings/card-payments${query}`;
  const screen = await openShopScreen(routes, path, buildMembership(), [page]);
  const { http, shop, fixture } = screen;
  http.expectOne(shop('/shop')).flush(buildShop({ cardPayments }));
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, press, go };
}

describe('CardPayments', () => {
  it("leads to the provider's page, once for two presses", async () => {
    const { press, http, shop, go, fixture } = await open();
    await press('Set up card payments');
    const button = http.expectOne(shop('/shop/card-payments'));
    button.flush({ url: 'https://provider.test/setup' });
    await fixture.whenStable();
    expect(go).toHaveBeenCalledWith('https://provider.test/setup');
    await press('Set up card payments');
    http.expectNone(shop('/shop/card-payments'));
  });

  it('asks afresh on the way back, and says that it is ready', async () => {
    const { http, shop, fixture, element, loader } = await open('?from=provider', 'in-progress');
    http.expectOne(shop('/shop/card-payments/refresh')).flush(buildShop({ cardPayments: 'ready' }));
    await fixture.whenStable();
    expect(element.textContent).toContain('Ready');
    expect(await loader.getAllHarnesses(MatButtonHarness)).toHaveLength(0);
  });

  it('says why when the provider is away, and lets it be tried again', async () => {
    const { press, http, shop, fixture, element } = await open('', 'in-progress');
    await press('Go on at the payment provider');
    const away = { type: '', title: '', status: 503, code: 'not-ready', detail: 'It does not answer.' };
    http.expectOne(shop('/shop/card-payments')).flush(away, { status: 503, statusText: '' });
    await fixture.whenStable();
    expect(element.querySelector('[role=alert]')?.textContent).toContain('It does not answer.');
    await press('Try again');
    http.expectOne(shop('/shop/card-payments'));
  });

  it('tells that a link was too old', async () => {
    expect((await open('?link=expired')).element.textContent).toContain('was too old');
  });
});
