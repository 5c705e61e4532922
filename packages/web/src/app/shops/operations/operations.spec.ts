import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import type { Role } from '@bookmatch/common/access/roles';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import shopsRoutes from '../shops.routes';
import { buildOperation } from '../testing/build-shop';

const routes = [{ path: 'settings', children: shopsRoutes }];
const id = (last: number) => `0190a1b2-0000-7000-8000-00000000060${last}`;
const rows = [
  buildOperation(),
  buildOperation({ id: id(2), name: 'Assemble boxes', position: 2 }),
  buildOperation({ id: id(3), name: 'Install', position: 3, costCategory: 'install' }),
  buildOperation({ id: id(4), name: 'Veneer press', position: 4, archived: true }),
];

async function open(role: Role = 'owner') {
  const screen = await openShopScreen(routes, '/settings/operations', buildMembership({ role }));
  const { http, shop, fixture, element } = screen;
  http.expectOne(shop('/operations')).flush({ rows });
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const names = () => [...element.querySelectorAll('ol strong')].map(({ textContent }) => textContent);
  const handle = (nth: number) => element.querySelectorAll<HTMLElement>('.handle')[nth];
  const key = async (nth: number, name: string) => {
    handle(nth)?.dispatchEvent(new KeyboardEvent('keydown', { key: name, bubbles: true, cancelable: true }));
    await fixture.whenStable();
  };
  return { ...screen, loader, press, names, handle, key };
}

describe('Operations', () => {
  it('stand in the order of the work, archived ones apart', async () => {
    const { names, element } = await open();
    expect(names()).toEqual(['Cut sheet goods', 'Assemble boxes', 'Install']);
    expect(element.textContent).toContain('$65.00 an hour');
    expect(element.querySelector('ul')?.textContent).toContain('Veneer press');
  });

  it('are moved by the arrow keys, with the focus going along', async () => {
    const { key, names, handle, http, shop } = await open();
    await key(2, 'ArrowUp');
    expect(names()).toEqual(['Cut sheet goods', 'Install', 'Assemble boxes']);
    expect(document.activeElement).toBe(handle(1));
    expect(http.expectOne(shop('/operations/reorder')).request.body).toEqual({
      operationIds: [id(1), id(3), id(2), id(4)],
    });
    await key(0, 'ArrowUp');
    http.expectNone(shop('/operations/reorder'));
  });

  it('go back to the order that holds when the server refuses', async () => {
    const { key, names, http, shop, fixture } = await open();
    await key(0, 'ArrowDown');
    const refusal = { type: '', title: '', status: 422, code: 'invalid-input', detail: 'Changed meanwhile.' };
    http.expectOne(shop('/operations/reorder')).flush(refusal, { status: 422, statusText: '' });
    await fixture.whenStable();
    http.expectOne(shop('/operations')).flush({ rows });
    await fixture.whenStable();
    expect(names()).toEqual(['Cut sheet goods', 'Assemble boxes', 'Install']);
    expect(document.body.textContent).toContain('Changed meanwhile.');
  });

  it('are added with what their hours count as', async () => {
    const { press, loader, http, shop, names, fixture } = await open();
    await press('Add operation');
    await press('Save operation');
    expect(document.body.textContent).toContain('The name cannot be empty.');
    const [name, rate] = await loader.getAllHarnesses(MatInputHarness);
    await name?.setValue('Veneer');
    await rate?.setValue('70');
    await press('Save operation');
    const request = http.expectOne(shop('/operations'));
    expect(request.request.body).toEqual({
      name: 'Veneer',
      costCategory: 'labor',
      onJob: true,
      defaultRateCentsPerHour: 7_000,
    });
    request.flush(buildOperation({ id: id(5), name: 'Veneer', position: 5 }));
    await fixture.whenStable();
    expect(names()).toContain('Veneer');
  });

  it('are changed with the version that was read, but for whether they belong to a job', async () => {
    const { loader, press, http, shop } = await open();
    const [menu] = await loader.getAllHarnesses(MatMenuHarness);
    await menu?.open();
    await menu?.clickItem({ text: /Change/ });
    await (await loader.getAllHarnesses(MatInputHarness))[0]?.setValue('Cut panels');
    await press('Save operation');
    const request = http.expectOne(shop(`/operations/${id(1)}`));
    expect(request.request.headers.get('If-Match')).toBe('"1"');
    expect(request.request.body).toEqual({
      name: 'Cut panels',
      costCategory: 'labor',
      defaultRateCentsPerHour: 6_500,
    });
  });

  it('are archived after asking, and brought back', async () => {
    const { loader, press, http, shop, names, fixture } = await open();
    const [menu] = await loader.getAllHarnesses(MatMenuHarness);
    await menu?.open();
    await menu?.clickItem({ text: /Archive/ });
    await press('Archive');
    http.expectOne(shop(`/operations/${id(1)}`)).flush(buildOperation({ version: 2, archived: true }));
    await fixture.whenStable();
    expect(names()).toEqual(['Assemble boxes', 'Install']);
    await (
      await loader.getHarness(MatButtonHarness.with({ selector: '[aria-label="Bring back Veneer press"]' }))
    ).click();
    const request = http.expectOne(shop(`/operations/${id(4)}`));
    expect(request.request.body).toEqual({ archived: false });
  });

  it('are read by the bookkeeper, who moves none', async () => {
    const { handle, loader } = await open('bookkeeper');
    expect(handle(0)).toBeUndefined();
    expect(await loader.getAllHarnesses(MatMenuHarness)).toHaveLength(0);
  });
});
