import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { LEAD_STAGES, type LeadRow } from '@bookmatch/common/leads/leads-contract';
import { buildLead, buildLeadRow } from '@bookmatch/common/testing/build-lead';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import leadsRoutes from '../leads.routes';

const routes = [{ path: 'leads', children: leadsRoutes }];
const row = buildLeadRow();
const next = buildLeadRow({ title: 'Window seat', stage: 'contacted' });

const boardOf = (...rows: LeadRow[]) => ({
  columns: LEAD_STAGES.map((stage) => {
    const own = rows.filter((one) => one.stage === stage);
    return { stage, count: own.length, rows: own, expectedCents: 0 };
  }),
});

async function open(rows: LeadRow[] = [row, next], role: 'owner' | 'bookkeeper' = 'owner') {
  const screen = await openShopScreen(routes, '/leads/board', buildMembership({ role }));
  screen.http.expectOne(screen.shop('/leads/board')).flush(boardOf(...rows));
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.documentRootLoader(screen.fixture);
  const column = (stage: string) => screen.element.querySelector(`.column.${stage}`)?.textContent ?? '';
  const card = (id: string) => screen.element.querySelector<HTMLElement>(`#lead-${id}`);
  const press = (id: string, key: string, shiftKey = false) =>
    card(id)?.dispatchEvent(new KeyboardEvent('keydown', { key, shiftKey, bubbles: true }));
  const pick = async (text: string) => {
    const menu = await loader.getHarness(
      MatMenuHarness.with({ selector: `[aria-label="Move ${row.title}"]` }),
    );
    await menu.open();
    await menu.clickItem({ text });
  };
  return { ...screen, loader, column, card, press, pick };
}

describe('LeadBoard', () => {
  it('pushes a card on with Shift and an arrow, and keeps the focus on it', async () => {
    const { press, http, shop, column, card, fixture } = await open();
    press(row.id, 'ArrowRight', true);
    await fixture.whenStable();
    expect(column('contacted')).toContain(row.title);
    expect(document.activeElement).toBe(card(row.id));
    const { request } = http.expectOne(shop(`/leads/${row.id}/move`));
    expect(request.body).toEqual({ stage: 'contacted' });
    expect(request.headers.get('If-Match')).toBe('"1"');
  });

  it('walks from card to card with the arrows alone', async () => {
    const { press, card, fixture } = await open();
    press(row.id, 'ArrowRight');
    await fixture.whenStable();
    expect(document.activeElement).toBe(card(next.id));
  });

  it('puts a refused card back where the server has it', async () => {
    const { pick, http, shop, column, fixture } = await open();
    await pick('Site visit');
    expect(column('site-visit')).toContain(row.title);
    const stale = {
      type: '',
      title: '',
      status: 412,
      code: 'stale-version',
      detail: 'Somebody changed this.',
    };
    http.expectOne(shop(`/leads/${row.id}/move`)).flush(stale, { status: 412, statusText: '' });
    http.expectOne(shop(`/leads/${row.id}`)).flush(buildLead({ id: row.id, version: 2, stage: 'contacted' }));
    http.expectOne(shop('/leads/board')).flush(boardOf({ ...row, version: 2, stage: 'contacted' }));
    await fixture.whenStable();
    expect(column('contacted')).toContain(row.title);
    expect(column('site-visit')).not.toContain(row.title);
  });

  it('asks why a lead is lost, and does not lose it without a reason', async () => {
    const { pick, loader, http, shop, column, fixture } = await open();
    await pick('Lost…');
    const dialog = await loader.getHarness(MatDialogHarness);
    const agree = await dialog.getHarness(MatButtonHarness.with({ text: 'It is lost' }));
    await agree.click();
    expect(await dialog.getText()).toContain('Choose why the lead was lost.');
    http.expectNone(shop(`/leads/${row.id}/lose`));
    await (await dialog.getHarness(MatSelectHarness)).clickOptions({ text: 'Price' });
    await agree.click();
    const request = http.expectOne(shop(`/leads/${row.id}/lose`));
    expect(request.request.body).toEqual({ reason: 'price', note: '' });
    request.flush(buildLead({ ...row, stage: 'lost', lostReason: 'price', version: 2 }));
    await fixture.whenStable();
    expect(await loader.getAllHarnesses(MatDialogHarness)).toHaveLength(0);
    expect(column('lost')).toContain(row.title);
  });

  it('asks before a lead is won for good', async () => {
    const { pick, loader, http, shop } = await open();
    await pick('Won…');
    http.expectNone(shop(`/leads/${row.id}/win`));
    const dialog = await loader.getHarness(MatDialogHarness);
    await (await dialog.getHarness(MatButtonHarness.with({ text: 'It is won' }))).click();
    http.expectOne(shop(`/leads/${row.id}/win`));
  });

  it('is only read by the bookkeeper', async () => {
    const { element, press, http, shop } = await open([row], 'bookkeeper');
    expect(element.querySelector('button[aria-label^="Move"]')).toBeNull();
    press(row.id, 'ArrowRight', true);
    http.expectNone(shop(`/leads/${row.id}/move`));
  });

  it('shows one stage at a time on a phone, by its tabs', async () => {
    const { element, fixture } = await open();
    const tab = [...element.querySelectorAll<HTMLElement>('.tabs button')][1];
    tab?.click();
    await fixture.whenStable();
    expect(tab?.getAttribute('aria-pressed')).toBe('true');
    expect(element.querySelectorAll('.column.shown')).toHaveLength(1);
    expect(element.querySelector('.column.shown')?.textContent).toContain(next.title);
  });
});
