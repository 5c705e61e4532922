import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { MatDialogHarness } from '@angular/material/dialog/testing';
import { MatMenuHarness } from '@angular/material/menu/testing';
import { Router } from '@angular/router';
import type { Role } from '@bookmatch/common/access/roles';
import { NavCounts } from '../../platform/page/nav-counts';
import { SessionPage } from '../../platform/session/session.actions';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { CLOCK_SLOT } from '../slots';
import { Frame } from './frame';

@Component({
  selector: 'bm-screen',
  template: '<h1>Screen</h1>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Screen {}

@Component({
  selector: 'bm-pill',
  template: 'Not clocked in',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Pill {}

const routes = [
  {
    path: '',
    component: Frame,
    children: [
      { path: 'today', component: Screen },
      { path: 'jobs', component: Screen },
    ],
  },
];

async function open(role: Role = 'owner', access: 'full' | 'read-only' = 'full') {
  const subscription = { access, banner: 'none', daysLeft: null } as const;
  const clock = { provide: CLOCK_SLOT, useValue: () => Promise.resolve(Pill) };
  const screen = await openShopScreen(routes, '/today', buildMembership({ role, subscription }), [clock]);
  await screen.fixture.whenStable();
  const names = (selector: string) =>
    [...screen.element.querySelectorAll(selector)].map(({ textContent }) => textContent?.trim());
  return { ...screen, names, loader: TestbedHarnessEnvironment.documentRootLoader(screen.fixture) };
}

describe('Frame', () => {
  it('shows each role the places it may go to', async () => {
    const places: Record<string, unknown> = {};
    for (const role of ['owner', 'bookkeeper', 'lead-hand', 'crew'] as const) {
      const { names } = await open(role);
      places[role] = names('bm-nav .entry');
      TestBed.resetTestingModule();
    }
    expect(places).toEqual({
      owner: ['Today', 'Leads', 'Estimates', 'Jobs', 'Time', 'Invoices', 'Customers', 'Ledger', 'Settings'],
      bookkeeper: [
        'Today',
        'Leads',
        'Estimates',
        'Jobs',
        'Time',
        'Invoices',
        'Customers',
        'Ledger',
        'Settings',
      ],
      'lead-hand': ['Today', 'Jobs', 'Time', 'Customers'],
      crew: ['Today', 'Jobs', 'Time'],
    });
  });

  it('gives the crew three places within reach of a thumb, the others More', async () => {
    const crew = await open('crew');
    expect(crew.names('bm-bottom-bar nav > *')).toEqual(['Clock', 'My week', 'My jobs']);
    TestBed.resetTestingModule();
    const owner = await open('owner');
    expect(owner.names('bm-bottom-bar nav > a, bm-bottom-bar nav > button')).toEqual([
      'Today',
      'Jobs',
      'Clock',
      'More',
    ]);
  });

  it('counts what waits beside an entry', async () => {
    const { names, fixture } = await open();
    TestBed.inject(NavCounts).set('leads', 3);
    await fixture.whenStable();
    expect(names('.count')).toEqual(['3 waiting']);
  });

  it('opens quick find from anywhere by Ctrl K', async () => {
    const { loader } = await open();
    const key = new KeyboardEvent('keydown', { key: 'k', ctrlKey: true, cancelable: true });
    document.dispatchEvent(key);
    expect(key.defaultPrevented).toBe(true);
    while (!document.querySelector('bm-quick-find')) await new Promise((resolve) => setTimeout(resolve));
    expect(await loader.getAllHarnesses(MatDialogHarness)).toHaveLength(1);
  });

  it('puts the focus on a new screen, and leaves it for a change of filters', async () => {
    const { element } = await open();
    const router = TestBed.inject(Router);
    const screen = element.querySelector<HTMLElement>('#screen');
    await router.navigateByUrl('/jobs');
    expect(document.activeElement).toBe(screen);
    screen?.blur();
    await router.navigateByUrl('/jobs?q=a');
    expect(document.activeElement).not.toBe(screen);
  });

  it('fills the slot of the clock, and says when nothing can be changed', async () => {
    const { element } = await open('owner', 'read-only');
    expect(element.querySelector('bm-pill')?.textContent).toBe('Not clocked in');
    expect(element.textContent).toContain('The subscription has lapsed.');
  });

  it('signs out from the person menu', async () => {
    const { loader, store } = await open();
    const dispatch = jest.spyOn(store, 'dispatch');
    const [menu] = await loader.getAllHarnesses(MatMenuHarness.with({ triggerText: 'AF' }));
    await menu?.open();
    await menu?.clickItem({ text: /Sign out everywhere/ });
    expect(dispatch).toHaveBeenCalledWith(SessionPage.signOutPressed({ everywhere: true }));
  });
});
