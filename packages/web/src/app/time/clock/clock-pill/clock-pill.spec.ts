import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatMenuHarness } from '@angular/material/menu/testing';
import type { Membership } from '@bookmatch/common/accounts/accounts-contract';
import type { ClockState } from '@bookmatch/common/time/clock-contract';
import { buildMembership } from '../../../testing/session';
import { openShopScreen } from '../../../testing/shop-screen';
import { buildClock, buildOpenEntry, FRAMES } from '../../testing/build-punch';
import { ClockPill } from './clock-pill';

const running = (): ClockState =>
  buildClock({ open: buildOpenEntry({ startedAt: new Date(Date.now() - 125.5 * 60_000).toISOString() }) });

async function open(clock: ClockState | null, membership: Membership = buildMembership()) {
  const screen = await openShopScreen([{ path: '', component: ClockPill }], '/', membership);
  const { http, shop, fixture } = screen;
  if (clock) http.expectOne(shop('/time/clock')).flush(clock);
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  return { ...screen, menu: () => loader.getHarness(MatMenuHarness) };
}

describe('ClockPill', () => {
  it('tells what runs and for how long, also to the ear', async () => {
    const { element } = await open(running());
    const pill = element.querySelector('.pill');
    expect(pill?.getAttribute('aria-label')).toBe('Clocked in: Face frames, 2:05');
    expect(pill?.textContent).toContain('2:05');
  });

  it('clocks out, switches and takes a break from its menu', async () => {
    const { menu, http, shop, fixture } = await open(running());
    const pill = await menu();
    await pill.open();
    const items = await Promise.all((await pill.getItems()).map((item) => item.getText()));
    expect(items.map((text) => text.replace(/\s+/g, ' ').trim())).toEqual([
      'Clock out',
      'Take a meal break',
      'Assemble boxes Job 1039, Kitchen, Alder Court · 0.5 h over',
      'The clock, and other jobs',
    ]);
    await pill.clickItem({ text: /Clock out/ });
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
    http.expectOne(shop(`/time/entries/${FRAMES.entry}/clock-out`));
    expect(await pill.getTriggerText()).toContain('Clock in');
  });

  it('clocks in from the desk', async () => {
    const { menu, http, shop } = await open(buildClock());
    const pill = await menu();
    await pill.open();
    await pill.clickItem({ text: /Face frames/ });
    await new Promise((resolve) => setTimeout(resolve));
    const { body } = http.expectOne(shop('/time/clock-in')).request;
    expect(body).toMatchObject({ source: 'desk', operationId: FRAMES.operation });
  });

  it('is not there in a shop whose subscription has lapsed', async () => {
    const lapsed = { access: 'read-only', banner: 'read-only', daysLeft: null } as const;
    const { element, http, shop } = await open(null, buildMembership({ subscription: lapsed }));
    http.expectNone(shop('/time/clock'));
    expect(element.querySelector('.pill')).toBeNull();
  });
});
