import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { DataTableHarness } from '../../ui/data-table/data-table.harness';
import jobsRoutes from '../jobs.routes';
import { buildJobRow } from '../testing/build-jobs';

const routes = [{ path: 'jobs', children: jobsRoutes }];

async function open(url = '/jobs', membership = buildMembership()) {
  const screen = await openShopScreen(routes, url, membership);
  const table = await TestbedHarnessEnvironment.loader(screen.fixture).getHarness(DataTableHarness);
  return { ...screen, table };
}

describe('JobList', () => {
  it('shows cost and contract to who may see money, and what ran over', async () => {
    const { http, shop, table, element } = await open('/jobs?stage=building&sort=title');
    const money = { contractTotalCents: 970_300, plannedCostCents: 50_000, actualCostCents: 62_000 };
    const row = buildJobRow({ installOn: '2027-02-18', ...money });
    http.expectOne(shop('/jobs?sort=title&stage=building')).flush({ rows: [row], next: null, total: 1 });
    const [cells] = await table.cellTexts();
    expect(cells).toEqual([
      'Mudroom lockers and bench',
      '1042',
      'Wren Halloway',
      'Building',
      expect.stringMatching(/Thu, Feb 18/),
      '1.5 h of 10.0 h',
      '$620, over its plan',
      '$9,703',
    ]);
    const csv = element.querySelector<HTMLAnchorElement>('a[download]');
    expect(csv?.getAttribute('href')).toBe(shop('/jobs/export?sort=title&stage=building'));
  });

  it('has neither column nor button for a lead hand that are not theirs', async () => {
    const { http, shop, table, element } = await open('/jobs', buildMembership({ role: 'lead-hand' }));
    http.expectOne(shop('/jobs')).flush({ rows: [buildJobRow()], next: null, total: 1 });
    expect((await table.cellTexts())[0]).toHaveLength(6);
    expect(element.textContent).not.toMatch(/Contract|Add job|\$/);
  });
});
