import {
  confirmEmailSchema,
  membershipSchema,
  personSchema,
  resendConfirmationSchema,
  sessionSchema,
  signUpSchema,
  updatePersonSchema,
} from '@bookmatch/common/accounts/accounts-contract';
import { createShopSchema } from '@bookmatch/common/shops/shops-contract';
import { accountRoute, type Route } from '../../platform/http/route.js';
import type { AccountsService } from './accounts-service.js';

/** Becoming somebody, and being somebody. */
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
      handle: ({ scope, body }) => service.requestSignUp(scope, body),
    }),
    accountRoute({
      method: 'post',
      path: '/resend-confirmation',
      summary: 'Send the letter that confirms an address once more',
      allow: 'anyone',
      limit: 'mailing',
      // Each asks for a letter; the limit holds them back.
      repeat: 'natural',
      body: resendConfirmationSchema,
      status: 202,
      handle: ({ scope, body }) => service.requestConfirmation(scope, body.email),
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
      method: 'get',
      path: '/session',
      summary: 'Who is signed in, and their shops',
      allow: 'signed-in',
      answer: sessionSchema,
      handle: ({ scope, personId }) => service.session(scope, personId ?? ''),
    }),
    accountRoute({
      method: 'patch',
      path: '/person',
      summary: 'Change the own name',
      allow: 'signed-in',
      body: updatePersonSchema,
      answer: personSchema,
      handle: ({ scope, personId, body }) => service.rename(scope, personId ?? '', body.name),
    }),
    accountRoute({
      method: 'post',
      path: '/shops',
      summary: 'Open one more shop',
      allow: 'signed-in',
      body: createShopSchema,
      answer: membershipSchema,
      status: 201,
      handle: ({ scope, personId, body }) => service.addShop(scope, personId ?? '', body),
    }),
  ];
}
