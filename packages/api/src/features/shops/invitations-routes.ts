import { sessionSchema, type Session } from '@bookmatch/common/accounts/accounts-contract';
import {
  acceptInvitationSchema,
  invitationOfferSchema,
  invitationSchema,
  invitationsSchema,
  inviteSchema,
  openInvitationSchema,
} from '@bookmatch/common/shops/members-contract';
import type { GlobalScope } from '../../platform/database/scope.js';
import { accountRoute, shopRoute, type Route } from '../../platform/http/route.js';
import type { InvitationAcceptance } from './invitation-acceptance.js';
import type { InvitationsService } from './invitations-service.js';

export function invitationsRoutes(service: InvitationsService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/invitations',
      summary: 'List the open invitations',
      allow: ['read', 'Invitation'],
      answer: invitationsSchema,
      handle: ({ scope }) => service.list(scope),
    }),
    shopRoute({
      method: 'post',
      path: '/invitations',
      summary: 'Invite somebody by e-mail',
      allow: ['create', 'Invitation'],
      body: inviteSchema,
      answer: invitationSchema,
      status: 201,
      handle: ({ scope, body }) => service.invite(scope, body),
    }),
    shopRoute({
      method: 'post',
      path: '/invitations/:id/resend',
      summary: 'Send an invitation again, with a new link',
      allow: ['send', 'Invitation'],
      answer: invitationSchema,
      handle: ({ scope, params }) => service.resend(scope, params.id),
    }),
    shopRoute({
      method: 'delete',
      path: '/invitations/:id',
      summary: 'Withdraw an invitation',
      allow: ['delete', 'Invitation'],
      status: 204,
      handle: ({ scope, params }) => service.withdraw(scope, params.id),
    }),
  ];
}

type SessionView = (scope: GlobalScope, personId: string) => Promise<Session>;

/** What somebody does with the link from the letter. The link is a secret, so it travels in bodies only. */
export function acceptanceRoutes(acceptance: InvitationAcceptance, sessionView: SessionView): Route[] {
  return [
    accountRoute({
      method: 'post',
      path: '/invitation-offer',
      summary: 'See what an invitation offers',
      allow: 'anyone',
      limit: 'guessing',
      // Only reads; a POST keeps the secret out of logs and histories.
      repeat: 'natural',
      body: openInvitationSchema,
      answer: invitationOfferSchema,
      handle: ({ scope, body }) => acceptance.offer(scope, body.token),
    }),
    accountRoute({
      method: 'post',
      path: '/accept-invitation',
      summary: 'Accept an invitation, as somebody new or as who is signed in',
      allow: 'anyone',
      limit: 'guessing',
      // The link works once.
      repeat: 'natural',
      transaction: 'own',
      body: acceptInvitationSchema,
      answer: sessionSchema,
      async handle({ work, stamp, body, personId, session }) {
        const accepted = await acceptance.accept(work, stamp, body, personId);
        if (personId === null) await session.signIn(accepted);
        return work.read(stamp, (scope) => sessionView(scope, accepted));
      },
    }),
  ];
}
