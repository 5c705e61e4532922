import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import type { Subscription } from '@bookmatch/common/subscription/subscription-contract';
import { ScannedActionsSubject } from '@ngrx/store';
import { SessionPage } from '../../platform/session/session.actions';
import { PageLoad } from '../../platform/session/page-load';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import subscriptionRoutes from '../subscription.routes';
import { buildSubscription } from '../testing/build-subscription';

const routes = [{ path: 'settings/subscription', children: subscriptionRoutes }];

async function open(query = '') {
  const go = jest.fn();
  const page = { provide: PageLoad, useValue: { go } };
  const path = `/settings/subscription${query}`;
  const screen = await openShopScreen(routes, path, buildMembership(), [page]);
  const { http, shop, fixture } = screen;
  const seen: string[] = [];
  TestBed.inject(ScannedActionsSubject).subscribe(({ type }) => seen.push(type));
  const told = () => seen;
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const answer = async (path: string, fields: Partial<Subscription> = {}) => {
    http.expectOne(shop(path)).flush(buildSubscription(fields));
    await fixture.whenStable();
  };
  const buttons = async () => {
    const all = await loader.getAllHarnesses(MatButtonHarness);
    return Promise.all(all.map((button) => button.getText()));
  };
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, answer, buttons, press, go, told };
}

describe('SubscriptionScreen', () => {
  it('shows what a month will cost, and leads to the page to subscribe', async () => {
    const { answer, element, buttons, press, http, shop, fixture, go } = await open();
    await answer('/subscription');
    expect(element.querySelector('tfoot')?.textContent).toContain('$116.00');
    expect(await buttons()).toEqual(['Subscribe']);
    await press('Subscribe');
    http.expectOne(shop('/subscription/checkout')).flush({ url: 'https://provider.test/pay' });
    await fixture.whenStable();
    expect(go).toHaveBeenCalledWith('https://provider.test/pay');
  });

  it('leads a shop that is subscribed to its card and bills', async () => {
    const { answer, buttons, press, http, shop } = await open();
    await answer('/subscription', { status: 'active', currentPeriodEnd: '2026-07-15T12:00:00Z' });
    expect(await buttons()).toEqual(['Card, bills and ending it']);
    await press('Card, bills and ending it');
    http.expectOne(shop('/subscription/portal'));
  });

  it('offers a shop whose subscription has ended to start anew', async () => {
    const { answer, buttons } = await open();
    await answer('/subscription', { status: 'canceled' });
    expect(await buttons()).toEqual(['Card, bills and ending it', 'Subscribe']);
  });

  it('asks afresh on the way back, and has the frame follow', async () => {
    const { answer, element, told } = await open('?from=provider');
    await answer('/subscription/refresh', { status: 'active', currentPeriodEnd: '2026-07-15T12:00:00Z' });
    expect(told()).toContain(SessionPage.shopChanged.type);
    expect(element.textContent).toContain('Active');
  });

  it('says why when the payment provider is away', async () => {
    const { answer, press, http, shop, fixture, element } = await open();
    await answer('/subscription');
    await press('Subscribe');
    const away = { type: '', title: '', status: 503, code: 'not-ready', detail: 'It does not answer.' };
    http.expectOne(shop('/subscription/checkout')).flush(away, { status: 503, statusText: '' });
    await fixture.whenStable();
    expect(element.querySelector('[role=alert]')?.textContent).toContain('It does not answer.');
  });
});
