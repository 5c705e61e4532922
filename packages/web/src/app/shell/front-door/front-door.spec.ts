import { PageLoad } from '../../platform/session/page-load';
import { SessionApi } from '../../platform/session/session.actions';
import { buildMembership, buildSession } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import { FrontDoor } from './front-door';

const routes = [{ path: '', component: FrontDoor }];

async function open(url: string) {
  localStorage.clear();
  const gone: string[] = [];
  const page = { provide: PageLoad, useValue: { go: (path: string) => gone.push(path) } };
  return { ...(await openShopScreen(routes, url, buildMembership(), [page])), gone };
}

describe('FrontDoor', () => {
  it('leads on to the only shop', async () => {
    expect((await open('/')).gone).toEqual(['/s/northgrain/']);
  });

  it('does not lead on from a shop that is not theirs, but says so and lists theirs', async () => {
    const { gone, element, store, fixture } = await open('/?unknown-shop');
    store.dispatch(
      SessionApi.loaded({ session: buildSession([buildMembership(), buildMembership({ slug: 'second' })]) }),
    );
    await fixture.whenStable();
    expect(gone).toEqual([]);
    expect(element.querySelector('[role=alert]')?.textContent).toContain('That shop does not exist');
    expect([...element.querySelectorAll('a')].map((link) => link.getAttribute('href'))).toEqual([
      '/s/northgrain/',
      '/s/second/',
    ]);
  });

  it('tells somebody without a shop how to get into one', async () => {
    const { element, store, fixture } = await open('/?unknown-shop');
    store.dispatch(SessionApi.loaded({ session: buildSession([]) }));
    await fixture.whenStable();
    expect(element.textContent).toContain('You do not belong to a shop');
  });
});
