import type { Action } from '@ngrx/store';
import { firstValueFrom, of, throwError, toArray } from 'rxjs';
import { Actions } from '@ngrx/effects';
import { buildSession } from '../../testing/session';
import { ApiProblem } from '../api/api-problem';
import type { PageLoad } from './page-load';
import type { SessionApiClient } from './session-api';
import { SessionApi, SessionPage } from './session.actions';
import { leaveWhenSignedOut, loadSession, signOut } from './session.effects';

const problem = { type: '', title: '', status: 401, code: 'not-signed-in', detail: '' };
const actions = (action: Action) => new Actions(of(action));
const api = (methods: Partial<SessionApiClient>) => methods as SessionApiClient;

describe('session effects', () => {
  it('loads the session at the start and after signing in again', async () => {
    const session = buildSession();
    const client = api({ read: () => of(session) });
    for (const action of [SessionPage.started({ slug: null }), SessionPage.signedIn()])
      expect(await firstValueFrom(loadSession(actions(action), client))).toEqual(
        SessionApi.loaded({ session }),
      );
  });

  it('takes nobody signed in for an answer, anything else for a failure', async () => {
    const failing = (code: string) =>
      api({ read: () => throwError(() => new ApiProblem({ ...problem, code })) });
    const outcome = async (code: string) =>
      (await firstValueFrom(loadSession(actions(SessionPage.signedIn()), failing(code)))).type;
    expect(await outcome('not-signed-in')).toBe(SessionApi.missing.type);
    expect(await outcome('no-connection')).toBe(SessionApi.loadFailed.type);
  });

  it('signs out here or everywhere, and leaves the page by a full load', async () => {
    const asked: boolean[] = [];
    const client = api({ signOut: (everywhere) => (asked.push(everywhere), of(undefined)) });
    const press = SessionPage.signOutPressed({ everywhere: true });
    expect(await firstValueFrom(signOut(actions(press), client).pipe(toArray()))).toEqual([
      SessionApi.signedOut(),
    ]);
    expect(asked).toEqual([true]);

    const gone: string[] = [];
    const page = { go: (path: string) => gone.push(path) } as unknown as PageLoad;
    await firstValueFrom(leaveWhenSignedOut(actions(SessionApi.signedOut()), page));
    expect(gone).toEqual(['/sign-in']);
  });
});
