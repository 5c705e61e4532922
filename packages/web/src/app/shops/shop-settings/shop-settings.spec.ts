import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { Role } from '@bookmatch/common/access/roles';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import shopsRoutes from '../shops.routes';
import { buildShop } from '../testing/build-shop';

// The largest form there is: its fields are found by their labels, one by one.
jest.setTimeout(20_000);

const routes = [{ path: 'settings', children: shopsRoutes }];

async function open(role: Role = 'owner') {
  const screen = await openShopScreen(routes, '/settings/shop', buildMembership({ role }));
  screen.http.expectOne(screen.shop('/shop')).flush(buildShop());
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const field = (label: string, nth = 0) =>
    loader
      .getAllHarnesses(MatInputHarness.with({ label }))
      .then((all) => all[nth] ?? Promise.reject(new Error(`There is no field ${label}.`)));
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const sent = () => screen.http.expectOne({ url: screen.shop('/shop'), method: 'PATCH' });
  return { ...screen, loader, field, press, sent };
}

describe('ShopSettings', () => {
  it('shows what stands and sends what was changed, with the version it was read at', async () => {
    const { field, press, sent, fixture } = await open();
    expect(await (await field('Shop name')).getValue()).toBe('Northgrain Cabinets');
    const rate = await field('Rate, state and local together');
    expect(await rate.getValue()).toBe('7');
    await rate.setValue('8.25');
    await press('Save settings');
    const request = sent();
    expect(request.request.headers.get('If-Match')).toBe('"3"');
    expect(request.request.body).toMatchObject({
      name: 'Northgrain Cabinets',
      defaultTaxRate: '0.0825',
      defaultBillingSchedule: buildShop().defaultBillingSchedule,
    });
    request.flush(buildShop({ version: 4, defaultTaxRate: '0.0825' }));
    await fixture.whenStable();
    await press('Save settings');
    expect(sent().request.headers.get('If-Match')).toBe('"4"');
  });

  it('says at the field what is wrong, and sends nothing', async () => {
    const { field, press, http, element } = await open();
    await (await field('Shop name')).setValue('');
    await (await field('E-mail')).setValue('nobody');
    await (await field('An invoice is due after')).setValue('400');
    await press('Save settings');
    http.expectNone({ method: 'PATCH' });
    for (const sentence of ['cannot be empty', 'not an e-mail address', 'at most 180 days'])
      expect(element.textContent).toContain(sentence);
  });

  it('says what is wrong with the stages of billing, and where', async () => {
    const { field, press, http, element } = await open();
    await (await field('Percent', 0)).setValue('half');
    await press('Save settings');
    expect(element.querySelector('bm-billing-schedule-fields mat-error')?.textContent).toContain(
      'number from 0 to 100',
    );
    await (await field('Percent', 0)).setValue('60');
    await press('Save settings');
    const told = element.querySelector('bm-billing-schedule-fields [role=alert]');
    expect(told?.textContent).toContain('nothing is left for the remainder');
    http.expectNone({ method: 'PATCH' });
  });

  it('adds, moves and removes stages', async () => {
    const { loader, field, press, sent } = await open();
    await press('Add a stage');
    await (await field('Stage', 3)).setValue('Punch list');
    await (await field('Percent', 2)).setValue('5 %');
    const up = await loader.getAllHarnesses(MatButtonHarness.with({ selector: '[aria-label$="stage up"]' }));
    await up[3]?.click();
    const remove = await loader.getAllHarnesses(
      MatButtonHarness.with({ selector: '[aria-label="Remove this stage"]' }),
    );
    await remove[1]?.click();
    await press('Save settings');
    const { defaultBillingSchedule } = sent().request.body as ReturnType<typeof buildShop>;
    expect(defaultBillingSchedule.map(({ name, share }) => [name, share])).toEqual([
      ['Deposit', { percent: '40' }],
      ['Punch list', { percent: '5' }],
      ['Installed', { remainder: true }],
    ]);
  });

  it('keeps what is typed when somebody else was quicker, and tells what they changed', async () => {
    const { field, press, sent, http, shop, fixture, element } = await open();
    await (await field('Phone')).setValue('555 0199');
    await press('Save settings');
    const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Changed meanwhile.' };
    sent().flush(problem, { status: 412, statusText: '' });
    await fixture.whenStable();
    http.expectOne(shop('/shop')).flush(buildShop({ version: 7, name: 'Northgrain & Co' }));
    await fixture.whenStable();
    expect(element.textContent).toContain('changed this meanwhile: name.');
    expect(await (await field('Phone')).getValue()).toBe('555 0199');
    await press('Save settings');
    expect(sent().request.headers.get('If-Match')).toBe('"7"');
  });

  it('can be read by the bookkeeper, and nothing of it changed', async () => {
    const { field, loader, element } = await open('bookkeeper');
    expect(element.textContent).toContain('Only an owner can change these.');
    expect(await (await field('Shop name')).isDisabled()).toBe(true);
    expect(await loader.getAllHarnesses(MatButtonHarness.with({ text: 'Save settings' }))).toEqual([]);
    const tabs = [...element.querySelectorAll('nav a')].map((tab) => tab.textContent?.trim());
    expect(tabs).toEqual(['Shop', 'Members', 'Operations']);
  });
});
