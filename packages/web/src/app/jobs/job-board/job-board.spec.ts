import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { buildJob } from '@bookmatch/common/testing/build-job';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import jobsRoutes from '../jobs.routes';
import { buildJobRow, idOf } from '../testing/build-jobs';

const routes = [{ path: 'jobs', children: jobsRoutes }];
const rows = [
  buildJobRow(),
  buildJobRow({ id: idOf(2), number: 1043, title: 'Window seat', stage: 'measured' }),
];

async function open(role: 'owner' | 'bookkeeper' = 'owner') {
  const screen = await openShopScreen(routes, '/jobs/board', buildMembership({ role }));
  const { http, shop, fixture, element } = screen;
  http.expectOne(shop('/jobs?stage=open&sort=installOn&limit=200')).flush({ rows, next: null, total: 2 });
  await fixture.whenStable();
  const columnOf = (title: string) =>
    [...element.querySelectorAll('section')]
      .find((section) => section.textContent?.includes(title))
      ?.getAttribute('aria-label');
  return { ...screen, columnOf, loader: TestbedHarnessEnvironment.loader(fixture) };
}

describe('JobBoard', () => {
  it('has a column for every open stage, with its jobs', async () => {
    const { element, columnOf } = await open();
    const heads = [...element.querySelectorAll('h2')].map((head) => head.textContent?.trim());
    expect(heads[0]).toMatch(/^Accepted\s*0$/);
    expect(heads).toHaveLength(7);
    expect(columnOf('Mudroom')).toBe('Building');
    expect(columnOf('Window seat')).toBe('Measured');
  });

  it('moves a job from its menu at once, and back when that is refused', async () => {
    const { http, shop, columnOf, loader, fixture } = await open();
    const menu = await loader.getHarness(
      MatMenuHarness.with({ selector: '[aria-label="Move Mudroom lockers and bench"]' }),
    );
    await menu.open();
    await menu.clickItem({ text: 'Move to Finishing' });
    expect(columnOf('Mudroom')).toBe('Finishing');
    const refusal = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Changed meanwhile.' };
    http.expectOne(shop(`/jobs/${idOf(1)}/move`)).flush(refusal, { status: 412, statusText: '' });
    http
      .expectOne(shop(`/jobs/${idOf(1)}`))
      .flush(buildJob({ id: idOf(1), version: 2, stage: 'installing' }));
    await fixture.whenStable();
    expect(columnOf('Mudroom')).toBe('Installing');
  });

  it('is only to be read by who may not move jobs', async () => {
    const { element } = await open('bookkeeper');
    expect(element.querySelector('[aria-label^="Move"]')).toBeNull();
  });
});
