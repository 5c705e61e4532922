import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import type { Today } from '@bookmatch/common/today/today-contract';
import { NavCounts } from '../../platform/page/nav-counts';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { buildBookkeeperToday, buildLeadHandToday, buildOwnerToday } from '../testing/build-today';
import todayRoutes from '../today.routes';

const routes = [
  { path: 'today', children: todayRoutes },
  { path: 'time/clock', children: [] },
];

async function open(page: Exclude<Today, { role: 'crew' }>) {
  const screen = await openShopScreen(routes, '/today', buildMembership({ role: page.role }));
  screen.http.expectOne(screen.shop('/today')).flush(page);
  await screen.fixture.whenStable();
  const linkOf = (name: string) =>
    [...screen.element.querySelectorAll('a')]
      .find(({ textContent }) => textContent.includes(name))
      ?.getAttribute('href');
  return { ...screen, linkOf };
}

describe('the first page', () => {
  it('of the owner says what waits, and every figure leads to its list', async () => {
    const { element, linkOf } = await open(buildOwnerToday());
    expect(element.textContent).toContain('41.5 h clocked this week');
    expect(linkOf('Open leads')).toBe('/leads');
    expect(linkOf('Estimates waiting')).toBe('/estimates?status=sent');
    expect(linkOf('Jobs in hand')).toBe('/jobs/board');
    expect(linkOf('Overdue')).toBe('/invoices?standing=overdue');
    expect(linkOf('Expected within 30 days')).toBe('/invoices?standing=open&sort=dueOn');
    expect(linkOf('All 9')).toBe('/leads?nextStep=due');
    expect(element.querySelector('bm-stage-bar')?.textContent).toContain(
      '3 new · 1 site visit · 2 estimating',
    );
    expect(element.querySelector('bm-aging-spark svg')?.getAttribute('aria-label')).toContain(
      '1 to 30 days $5,640',
    );
    expect(element.querySelector('bm-leaf-pair')?.textContent).toContain('10.5 h');
  });

  it('of the owner counts in the navigation what it shows', async () => {
    await open(buildOwnerToday());
    expect(TestBed.inject(NavCounts).all()).toMatchObject({ leads: 9, invoices: 1 });
  });

  it('of the bookkeeper shows the money and says where nothing waits', async () => {
    const { element, linkOf } = await open(buildBookkeeperToday());
    expect(element.textContent).toContain('Orla Fenwick');
    expect(element.textContent).toContain('No drafts.');
    expect(linkOf('Came in this week')).toBe('/invoices/payments?from=2027-01-11');
  });

  it('of the lead hand shows jobs and installs', async () => {
    const { element } = await open(buildLeadHandToday());
    expect(element.textContent).toContain('you clocked 1 h 35 m so far');
    expect(element.textContent).toContain('Job 1042 · Wren Halloway · Building');
    expect(element.textContent).not.toContain('$');
  });

  it('of the crew is the clock', async () => {
    const { http, shop } = await openShopScreen(routes, '/today', buildMembership({ role: 'crew' }));
    expect(TestBed.inject(Router).url).toBe('/time/clock');
    http.expectNone(shop('/today'));
  });

  it('tries again after a failure, and keeps what it showed while it is read anew', async () => {
    const { http, shop, element, fixture } = await openShopScreen(routes, '/today');
    http.expectOne(shop('/today')).flush('', { status: 500, statusText: '' });
    await fixture.whenStable();
    [...element.querySelectorAll('button')]
      .find(({ textContent }) => textContent.includes('Try again'))
      ?.click();
    http.expectOne(shop('/today')).flush(buildOwnerToday());
    await fixture.whenStable();
    expect(element.textContent).toContain('Follow up');
  });
});
