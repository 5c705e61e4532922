import { buildMembership } from '../../testing/session';
import { openShopScreen } from '../../testing/shop-screen';
import jobsRoutes from '../jobs.routes';
import { buildJobRow, idOf } from '../testing/build-jobs';

const routes = [{ path: 'jobs', children: jobsRoutes }];

describe('MyJobs', () => {
  it('puts the jobs one is assigned to before those open to everybody', async () => {
    const membership = buildMembership({ role: 'crew' });
    const { http, shop, element, fixture } = await openShopScreen(routes, '/jobs', membership);
    const rows = [
      buildJobRow({ title: 'Bar cabinet' }),
      buildJobRow({ id: idOf(2), title: 'Window seat', assignedMemberIds: [membership.memberId] }),
    ];
    http.expectOne(shop('/jobs?stage=open&sort=installOn&limit=200')).flush({ rows, next: null, total: 2 });
    await fixture.whenStable();
    const texts = [...element.querySelectorAll('h2, .title')].map((each) => each.textContent?.trim());
    expect(texts).toEqual(['Assigned to you', 'Window seat', 'Open to the crew', 'Bar cabinet']);
  });

  it('says so when there is nothing', async () => {
    const membership = buildMembership({ role: 'crew' });
    const { http, shop, element, fixture } = await openShopScreen(routes, '/jobs', membership);
    http
      .expectOne(shop('/jobs?stage=open&sort=installOn&limit=200'))
      .flush({ rows: [], next: null, total: 0 });
    await fixture.whenStable();
    expect(element.textContent).toContain('No jobs for you right now');
  });
});
