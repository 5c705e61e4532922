import {
  changePasswordSchema,
  requestPasswordResetSchema,
  resetPasswordSchema,
} from '@bookmatch/common/accounts/accounts-contract';
import { accountRoute, type Route } from '../../platform/http/route.js';
import type { PasswordsService } from './passwords-service.js';

export function passwordsRoutes(service: PasswordsService): Route[] {
  return [
    accountRoute({
      method: 'post',
      path: '/request-password-reset',
      summary: 'Ask for a letter with a link to choose a new password',
      allow: 'anyone',
      limit: 'mailing',
      // Each asks for a letter; the limit holds them back.
      repeat: 'natural',
      body: requestPasswordResetSchema,
      status: 202,
      handle: ({ scope, body }) => service.requestReset(scope, body.email),
    }),
    accountRoute({
      method: 'post',
      path: '/reset-password',
      summary: 'Choose a new password by the link from the letter',
      allow: 'anyone',
      limit: 'guessing',
      // The link works once.
      repeat: 'natural',
      transaction: 'own',
      body: resetPasswordSchema,
      status: 204,
      handle: ({ work, stamp, body }) => service.reset(work, stamp, body),
    }),
    accountRoute({
      method: 'post',
      path: '/change-password',
      summary: 'Change the own password and sign out everywhere else',
      allow: 'signed-in',
      limit: 'guessing',
      // A repeat finds the current password changed and is refused.
      repeat: 'natural',
      transaction: 'own',
      body: changePasswordSchema,
      status: 204,
      async handle({ work, stamp, personId, session, body }) {
        const asker = { personId: personId ?? '', keepSid: session.id };
        await service.change(work, stamp, asker, body);
        await session.signIn(asker.personId);
      },
    }),
  ];
}
