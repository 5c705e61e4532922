import { ownSessionsSchema, sessionSchema, signInSchema } from '@bookmatch/common/accounts/accounts-contract';
import { notFound, ProblemError } from '../../platform/http/problem-error.js';
import { accountRoute, type Route } from '../../platform/http/route.js';
import { endSessions } from '../../platform/sessions/end-sessions.js';
import type { SessionListing, SessionStore } from '../../platform/sessions/session-store.js';
import type { AccountsService } from './accounts-service.js';
import { Person } from './person.entity.js';
import { verifyCredentials } from './sign-in.js';

/** Signing in and out, here and elsewhere. */
export function sessionsRoutes(service: AccountsService, sessions: SessionStore): Route[] {
  return [
    accountRoute({
      method: 'post',
      path: '/sign-in',
      summary: 'Sign in',
      allow: 'anyone',
      limit: 'guessing',
      // Each time starts a session of its own.
      repeat: 'natural',
      transaction: 'own',
      body: signInSchema,
      answer: sessionSchema,
      async handle({ work, stamp, body, session }) {
        const person = await work.read(stamp, (scope) => verifyCredentials(scope, body.email, body.password));
        if (!person) throw wrongCredentials();
        if (!person.emailConfirmedAt)
          throw new ProblemError(
            'conflict',
            'Confirm your e-mail address first. The link is in the letter we sent you.',
          );
        await session.signIn(person.id);
        const now = await work.read(stamp, (scope) => scope.global(Person).get(person.id));
        if (now.passwordHash !== person.passwordHash) {
          // The password was changed between the check and the new session, which the change could not end.
          await session.signOut();
          throw wrongCredentials();
        }
        return work.read(stamp, (scope) => service.session(scope, person.id));
      },
    }),
    accountRoute({
      method: 'post',
      path: '/sign-out',
      summary: 'Sign out here',
      allow: 'anyone',
      // Signed out is signed out.
      repeat: 'natural',
      transaction: 'own',
      status: 204,
      handle: ({ session }) => session.signOut(),
    }),
    accountRoute({
      method: 'post',
      path: '/sign-out-everywhere',
      summary: 'Sign out here and everywhere else',
      allow: 'signed-in',
      // As above.
      repeat: 'natural',
      transaction: 'own',
      status: 204,
      async handle({ work, stamp, personId, session }) {
        await work.transaction(stamp, (scope) => endSessions(scope, personId ?? ''));
        await session.signOut();
      },
    }),
    accountRoute({
      method: 'get',
      path: '/sessions',
      summary: 'Where the person is signed in',
      allow: 'signed-in',
      answer: ownSessionsSchema,
      async handle({ personId, session }) {
        const listed = await sessions.listOf(personId ?? '');
        return { rows: listed.map((one) => viewSession(one, sessions.isSame(session.id, one.sid))) };
      },
    }),
    accountRoute({
      method: 'delete',
      path: '/sessions/:id',
      summary: 'Sign out at one place',
      allow: 'signed-in',
      transaction: 'own',
      status: 204,
      async handle({ personId, params }) {
        if (!(await sessions.endOne(personId ?? '', params.id))) throw notFound('This session');
      },
    }),
  ];
}

const wrongCredentials = () =>
  new ProblemError('wrong-credentials', 'The e-mail address or the password is wrong.');

function viewSession({ id, userAgent, address, createdAt, lastSeenAt }: SessionListing, current: boolean) {
  return {
    id,
    current,
    userAgent,
    address,
    createdAt: createdAt.toISOString(),
    lastSeenAt: lastSeenAt.toISOString(),
  };
}
