import { TestBed } from '@angular/core/testing';
import type { Role } from '@bookmatch/common/access/roles';
import type { SubscriptionStanding } from '@bookmatch/common/subscription/subscription-contract';
import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { SubscriptionBanner } from './subscription-banner';

/** May be called more than once in a test. */
async function show(role: Role, banner: SubscriptionStanding['banner'], daysLeft: number | null = null) {
  TestBed.resetTestingModule();
  const access = banner === 'read-only' ? 'read-only' : 'full';
  const membership = buildMembership({ role, subscription: { access, banner, daysLeft } });
  const { element } = await openShopScreen([{ path: '', component: SubscriptionBanner }], '/', membership);
  const host = element.querySelector('bm-subscription-banner');
  return { text: host?.textContent?.replace(/\s+/g, ' ').trim(), link: host?.querySelector('a') };
}

describe('SubscriptionBanner', () => {
  it('is not there while all is well', async () => {
    expect((await show('owner', 'none', 9)).text).toBe('');
  });

  it('tells an owner how long the trial lasts, and how to go on', async () => {
    const { text, link } = await show('owner', 'trial-ending', 1);
    expect(text).toBe('The trial ends in 1 day. Subscribe');
    expect(link?.getAttribute('href')).toBe('/settings/subscription');
  });

  it('tells an owner how long a shop that did not pay goes on', async () => {
    const { text } = await show('owner', 'past-due-grace', 6);
    expect(text).toContain('In 6 days the shop becomes read-only. Pay or change the card');
  });

  it('troubles nobody who can do nothing about it', async () => {
    expect((await show('lead-hand', 'past-due-grace', 6)).text).toBe('');
    expect((await show('crew', 'trial-ending', 2)).text).toBe('');
  });

  it('tells everybody when nothing can be changed, and an owner where to mend it', async () => {
    const crew = await show('crew', 'read-only');
    expect(crew.text).toContain('Everything can be read and exported, nothing changed.');
    expect(crew.link).toBeNull();
    expect((await show('owner', 'read-only')).link).not.toBeNull();
  });
});
