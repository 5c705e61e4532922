import { provideEnvironmentInitializer, Component, ChangeDetectionStrategy } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { NavCounts } from '../platform/page/nav-counts';
import { openShopScreen } from '../testing/shop-screen';
import { keepNavCounts } from './keep-nav-counts';

@Component({ selector: 'bm-counted', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class Screen {}

const routes = [
  { path: 'today', component: Screen },
  { path: 'jobs', component: Screen },
];
const open = () =>
  openShopScreen(routes, '/today', undefined, [provideEnvironmentInitializer(keepNavCounts)]);

describe('the counts beside the navigation', () => {
  it('are read when somebody arrives, and not at every step', async () => {
    const { http, shop, harness } = await open();
    http.expectOne(shop('/today/counts')).flush({ leads: 3, invoices: 2 });
    expect(TestBed.inject(NavCounts).all()).toEqual({ leads: 3, invoices: 2 });
    await harness.navigateByUrl('/jobs');
    http.expectNone(shop('/today/counts'));
  });

  it('stay as they were when they cannot be read', async () => {
    const { http, shop } = await open();
    TestBed.inject(NavCounts).set('leads', 4);
    http.expectOne(shop('/today/counts')).flush('', { status: 500, statusText: '' });
    expect(TestBed.inject(NavCounts).all()).toEqual({ leads: 4 });
  });
});
