import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { buildLeadRow } from '@bookmatch/common/testing/build-lead';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { DataTableHarness } from '../../ui/data-table/data-table.harness';
import leadsRoutes from '../leads.routes';

const routes = [{ path: 'leads', children: leadsRoutes }];
const OPEN = '/leads?sort=nextStepOn&stage=open';

async function open(url = '/leads', role: 'owner' | 'bookkeeper' = 'owner') {
  const screen = await openShopScreen(routes, url, buildMembership({ role }));
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  return { ...screen, table: await loader.getHarness(DataTableHarness) };
}

describe('LeadList', () => {
  it('begins with the open leads, the soonest next step first, and marks what is late', async () => {
    const { http, shop, table } = await open();
    const row = buildLeadRow({ company: 'Alder LLC', nextStepOn: '2020-01-14' });
    http.expectOne(shop(OPEN)).flush({ rows: [row], next: null, total: 1 });
    const [cells] = await table.cellTexts();
    expect(cells?.[0]).toBe('Mudroom lockers and bench Wren Halloway, Alder LLC');
    expect(cells?.[1]).toBe('New');
    expect(cells?.[3]).toMatch(/^Tue, Jan 14, 2020, \d+ days late$/);
    expect(cells?.[5]).toBe('$14,000');
    expect(await table.sortOf('On')).toBe('ascending');
  });

  it('asks for what the address says', async () => {
    const { http, shop } = await open('/leads?stage=all&nextStep=overdue&source=referral&sort=-createdAt');
    http.expectOne(shop('/leads?nextStep=overdue&source=referral&sort=-createdAt'));
    TestBed.resetTestingModule();
    const other = await open('/leads?stage=lost');
    other.http.expectOne(other.shop('/leads?sort=nextStepOn&stage=lost'));
  });

  it('downloads what it shows', async () => {
    const { element, shop } = await open('/leads?stage=won&after=c1');
    expect(element.querySelector('a[download]')?.getAttribute('href')).toBe(
      shop('/leads/export?sort=nextStepOn&stage=won'),
    );
  });

  it('says what goes there, and offers the first step to who may take it', async () => {
    const { http, shop, element, fixture } = await open();
    http.expectOne(shop(OPEN)).flush({ rows: [], next: null, total: 0 });
    await fixture.whenStable();
    expect(element.querySelector('bm-empty-state')?.textContent).toContain('Add a lead');
    TestBed.resetTestingModule();
    const other = await open('/leads', 'bookkeeper');
    other.http.expectOne(other.shop(OPEN)).flush({ rows: [], next: null, total: 0 });
    await other.fixture.whenStable();
    expect(other.element.textContent).toContain('No open leads');
    expect(other.element.textContent).not.toContain('Add');
  });
});
