import { buildMembership, buildSession } from '../../testing/session';
import { SessionApi, SessionPage } from './session.actions';
import { sessionFeature, type SessionState } from './session.state';

const run = (...actions: Parameters<typeof sessionFeature.reducer>[1][]): SessionState =>
  actions.reduce<SessionState | undefined>(sessionFeature.reducer, undefined)!;
const elsewhere = buildMembership({ slug: 'second', role: 'bookkeeper' });
const session = buildSession([elsewhere, buildMembership()]);

describe('session', () => {
  it('knows the place that the member has in the shop of the address', () => {
    const state = run(SessionPage.started({ slug: 'second' }), SessionApi.loaded({ session }));
    expect(state.status).toBe('signed-in');
    expect(sessionFeature.selectMembership({ session: state })).toEqual(elsewhere);
    expect(sessionFeature.selectRole({ session: state })).toBe('bookkeeper');
  });

  it('has no place in a shop that is not theirs, nor outside of any', () => {
    for (const slug of ['unknown', null]) {
      const state = run(SessionPage.started({ slug }), SessionApi.loaded({ session }));
      expect(sessionFeature.selectMembership({ session: state })).toBeNull();
    }
  });

  it('tells signed out from a server that does not answer', () => {
    const problem = { type: '', title: '', status: 0, code: 'no-connection', detail: '' };
    expect(run(SessionApi.missing()).status).toBe('signed-out');
    expect(run(SessionApi.loadFailed({ problem })).problem).toBe(problem);
  });

  it('takes on a new name at once', () => {
    const state = run(SessionApi.loaded({ session }), SessionPage.nameChanged({ name: 'Ada Wren' }));
    expect(sessionFeature.selectPerson({ session: state })?.name).toBe('Ada Wren');
  });
});
