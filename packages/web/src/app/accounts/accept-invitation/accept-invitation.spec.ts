import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { InvitationOffer } from '@bookmatch/common/shops/members-contract';
import { PageLoad } from '../../platform/session/page-load';
import { SessionApi } from '../../platform/session/session.actions';
import { buildMembership, buildSession } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import accountsRoutes from '../accounts.routes';

const here = buildMembership();
const offer: InvitationOffer = {
  shopName: 'Larkspur Cabinets',
  email: 'ada@example.test',
  role: 'lead-hand',
  expiresAt: '2026-12-08T12:00:00Z',
  needsAccount: true,
};

async function open(offered: Partial<InvitationOffer>, signedIn: boolean) {
  const gone: string[] = [];
  const page = { provide: PageLoad, useValue: { go: (path: string) => gone.push(path) } };
  const screen = await openShopScreen(accountsRoutes, '/accept-invitation?token=secret', here, [page]);
  if (!signedIn) screen.store.dispatch(SessionApi.missing());
  const asked = screen.http.expectOne('/api/account/invitation-offer');
  expect(asked.request.body).toEqual({ token: 'secret' });
  asked.flush({ ...offer, ...offered });
  await screen.fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(screen.fixture);
  const press = async (text: string) => (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { ...screen, loader, press, gone };
}

describe('AcceptInvitation', () => {
  it('asks somebody new for a name and a password, and opens the shop they joined', async () => {
    const { loader, press, http, gone, element } = await open({}, false);
    expect(element.querySelector('h1')?.textContent).toBe('Join Larkspur Cabinets');
    const [name, password] = await loader.getAllHarnesses(MatInputHarness);
    await name?.setValue('Ada Fenwick');
    await password?.setValue('a long enough password');
    await press('Join');
    const asked = http.expectOne('/api/account/accept-invitation');
    expect(asked.request.body).toEqual({
      token: 'secret',
      name: 'Ada Fenwick',
      password: 'a long enough password',
    });
    asked.flush(buildSession([buildMembership({ slug: 'larkspur' })]));
    expect(gone).toEqual(['/s/larkspur/']);
  });

  it('lets somebody signed in join by one press', async () => {
    const { press, http, gone } = await open({ needsAccount: false }, true);
    await press('Join Larkspur Cabinets');
    const joined = buildMembership({ slug: 'larkspur' });
    http.expectOne('/api/account/accept-invitation').flush(buildSession([here, joined]));
    expect(gone).toEqual(['/s/larkspur/']);
  });

  it('asks somebody known to sign in first', async () => {
    const { element } = await open({ needsAccount: false }, false);
    expect(element.querySelector('bm-sign-in-form')).not.toBeNull();
  });

  it('does not let somebody else take the place', async () => {
    const { element } = await open({ email: 'other@example.test' }, true);
    expect(element.textContent).toContain('You are signed in as somebody else.');
    expect([...element.querySelectorAll('button')].map(({ textContent }) => textContent.trim())).toEqual([
      'Sign out',
    ]);
  });
});
