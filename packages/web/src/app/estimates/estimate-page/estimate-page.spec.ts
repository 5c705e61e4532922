import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatMenuHarness } from '@angular/material/menu/testing';
import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import type { Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { buildEstimate, buildRevision } from '@bookmatch/common/testing/build-estimate';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { WorkingHarness } from '../../ui/working/working.harness';
import estimatesRoutes from '../estimates.routes';

const routes = [{ path: 'estimates', children: estimatesRoutes }];
const estimate = buildEstimate();
const revision = estimate.currentRevision;
const path = `/estimates/${estimate.id}`;
const draftPath = `${path}/revisions/${revision.id}`;
const PAUSE = 900;

async function open(shown: Estimate = estimate, membership: Membership = buildMembership()) {
  const screen = await openShopScreen(routes, path, membership);
  const { http, shop, fixture, element } = screen;
  http.expectOne(shop(path)).flush(shown);
  http.expectOne(shop('/operations')).flush({ rows: [] });
  await fixture.whenStable();
  http.match(({ url }) => url === shop('/links')).forEach((request) => request.flush({ rows: [] }));
  await fixture.whenStable();
  const find = <Found extends HTMLElement>(selector: string) => element.querySelector<Found>(selector)!;
  const type = async (selector: string, text: string) => {
    const input = find<HTMLInputElement>(selector);
    input.value = text;
    input.dispatchEvent(new Event('input', { bubbles: true }));
    await fixture.whenStable();
  };
  const pause = async (ms = PAUSE) => {
    await new Promise((resolve) => setTimeout(resolve, ms));
    await fixture.whenStable();
  };
  const press = async (text: string) => {
    const buttons = [...document.querySelectorAll<HTMLElement>('button, a')];
    buttons.find(({ textContent }) => textContent?.trim().startsWith(text))!.click();
    await fixture.whenStable();
  };
  const put = () => http.expectOne({ method: 'PUT', url: shop(draftPath) });
  return { ...screen, find, type, pause, press, put, standing: () => find('.standing').textContent?.trim() };
}

describe('EstimatePage', () => {
  it('saves by itself a moment after the last key, with the version that was read', async () => {
    const { type, pause, put, standing, find } = await open();
    await type('.quantity input', '5');
    await type('.quantity input', '50');
    expect(standing()).toContain('Not saved yet');
    await pause();
    const call = put();
    expect(call.request.headers.get('If-Match')).toBe('"1"');
    expect(call.request.body).toMatchObject({ rooms: [{ lines: [{ quantity: '50' }] }] });
    call.flush(buildRevision({ ...revision, version: 2 }));
    await pause(0);
    expect(standing()).toContain('Saved');
    expect(find('bm-line-row .amount').textContent).toContain('6,200.00');
  });

  it('follows the typing with the price, and opens what it is made of', async () => {
    const { type, fixture } = await open();
    await type('.price input', '200');
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const [material] = await loader.getAllHarnesses(WorkingHarness);
    expect(await material?.figureText()).toContain('$267.00');
    await material?.press();
    expect((await material?.lines())?.at(-1)).toEqual(['Material', '$267.00']);
    const figures = await Promise.all(
      (await loader.getAllHarnesses(WorkingHarness)).map((working) => working.figureText()),
    );
    expect(figures.at(-1)).toContain('$649.50');
  });

  it('says what needs correcting, and sends nothing until it is', async () => {
    const { type, pause, http, shop, standing, find } = await open();
    await type('.quantity input', 'many');
    await pause();
    http.expectNone(shop(draftPath));
    expect(standing()).toContain('1 field needs correcting');
    expect(find('bm-line-row .problem').textContent).toContain('Give a number');
  });

  it('loses nothing typed when somebody else saved meanwhile, and saves over it knowingly', async () => {
    const { type, pause, put, http, shop, find, press } = await open();
    await type('.quantity input', '7');
    await pause();
    const stale = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Changed.' };
    put().flush({ ...stale, facts: { version: 3 } }, { status: 412, statusText: '' });
    await pause(0);
    const theirs = buildRevision({ ...revision, version: 3, intro: 'From the other window' });
    http.expectOne(shop(path)).flush({ ...estimate, currentRevision: theirs });
    http.expectOne(shop('/operations')).flush({ rows: [] });
    await pause(0);
    expect(find('.choice').textContent).toContain('They changed: introduction.');
    expect(find<HTMLInputElement>('.quantity input').value).toBe('7');
    await press('Keep mine');
    const { request } = put();
    expect(request.headers.get('If-Match')).toBe('"3"');
    expect(request.body).toMatchObject({ intro: '', rooms: [{ lines: [{ quantity: '7' }] }] });
  });

  it('takes back a deleted line', async () => {
    const { fixture, element, press } = await open();
    const loader = TestbedHarnessEnvironment.loader(fixture);
    const menu = await loader.getHarness(MatMenuHarness.with({ selector: '[aria-label="Menu of line 1"]' }));
    await menu.clickItem({ text: /Delete/ });
    expect(element.querySelectorAll('bm-line-row')).toHaveLength(0);
    await press('Undo');
    expect(element.querySelectorAll('bm-line-row')).toHaveLength(1);
  });

  it('moves a line by keyboard and goes on to a new one with Enter', async () => {
    const { element, find, fixture } = await open();
    const descriptions = () =>
      [...element.querySelectorAll<HTMLInputElement>('.description')].map(({ value }) => value);
    find('.description').dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter', bubbles: true }));
    await fixture.whenStable();
    expect(descriptions()).toEqual(['Birch ply, 3/4 in', '']);
    expect(document.activeElement).toBe(element.querySelectorAll('.description')[1]);
    find('.handle').dispatchEvent(
      new KeyboardEvent('keydown', { key: 'ArrowDown', altKey: true, bubbles: true }),
    );
    await fixture.whenStable();
    expect(descriptions()).toEqual(['', 'Birch ply, 3/4 in']);
  });

  it('sends what is kept, and says first what keeps it from being sent', async () => {
    const blocked = { ...estimate, currentRevision: { ...revision, sendRefusals: ['Add a line.'] } };
    const first = await open(blocked);
    await first.press('Send to customer');
    expect(document.querySelector('bm-send-dialog')?.textContent).toContain('Add a line.');
    expect(document.querySelector<HTMLButtonElement>('bm-send-dialog button[type=submit]')?.disabled).toBe(
      true,
    );
  });

  it('mails the estimate with the versions that were read', async () => {
    const { press, http, shop } = await open();
    await press('Send to customer');
    http.expectNone(shop(draftPath));
    document.querySelector<HTMLButtonElement>('bm-send-dialog button[type=submit]')?.click();
    const { request } = http.expectOne(shop(`${path}/send`));
    expect(request.headers.get('If-Match')).toBe('"1"');
    expect(request.body).toEqual({ to: 'wren@example.com', message: '', revisionVersion: 1 });
  });

  it('shows a sent revision to be read, with the next step to who may take it', async () => {
    const sentRevision = buildRevision({ ...revision, status: 'sent', sentAt: '2026-03-05T15:00:00.000Z' });
    const sent: Estimate = { ...estimate, status: 'sent', currentRevision: sentRevision };
    const owner = await open(sent);
    expect(owner.element.querySelector('bm-draft-builder')).toBeNull();
    expect(owner.find('bm-page-head').textContent).toContain('New revision');
  });

  it('lets a bookkeeper read a draft and change nothing', async () => {
    const { element, find } = await open(estimate, buildMembership({ role: 'bookkeeper' }));
    expect(element.querySelector('bm-draft-builder')).toBeNull();
    expect(find('bm-revision-view').textContent).toContain('Birch ply');
    expect(find('bm-page-head').textContent).not.toContain('Send');
  });
});
