import {
  confirmEmailSchema,
  sessionSchema,
  signInSchema,
  signUpSchema,
} from '@bookmatch/common/accounts/accounts-contract';
import { ProblemError } from '../../platform/http/problem-error.js';
import { accountRoute, type Route } from '../../platform/http/route.js';
import type { AccountsService } from './accounts-service.js';
import { verifyCredentials } from './sign-in.js';

export function accountsRoutes(service: AccountsService): Route[] {
  return [
    accountRoute({
      method: 'post',
      path: '/sign-up',
      summary: 'Sign up a person and their shop',
      allow: 'anyone',
      limit: 'mailing',
      // A repeat finds the address known and only sends a letter.
      repeat: 'natural',
      body: signUpSchema,
      status: 202,
      handle: ({ scope, body }) => service.signUp(scope, body),
    }),
    accountRoute({
      method: 'post',
      path: '/confirm-email',
      summary: 'Confirm an e-mail address and sign in',
      allow: 'anyone',
      limit: 'guessing',
      // The link works once.
      repeat: 'natural',
      transaction: 'own',
      body: confirmEmailSchema,
      answer: sessionSchema,
      async handle({ work, stamp, body, session }) {
        const person = await work.transaction(stamp, (scope) => service.confirmEmail(scope, body.token));
        await session.signIn(person.id);
        return work.read(stamp, (scope) => service.session(scope, person.id));
      },
    }),
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
        if (!person)
          throw new ProblemError('wrong-credentials', 'The e-mail address or the password is wrong.');
        if (!person.emailConfirmedAt)
          throw new ProblemError(
            'conflict',
            'Confirm your e-mail address first. The link is in the letter we sent you.',
          );
        await session.signIn(person.id);
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
      method: 'get',
      path: '/session',
      summary: 'Who is signed in, and their shops',
      allow: 'signed-in',
      answer: sessionSchema,
      handle: ({ scope, personId }) => service.session(scope, personId ?? ''),
    }),
  ];
}
