import { ROLE_NAMES, type Role } from '@bookmatch/common/access/roles';
import type { Letter } from '../../platform/mail/mail.js';

type Invited = { email: string; role: Role; shopName: string; invitedBy: string };

export function invitationLetter(
  { email, role, shopName, invitedBy }: Invited,
  origin: string,
  token: string,
): Letter {
  return {
    to: email,
    fromName: 'Bookmatch',
    subject: `${invitedBy} invites you to ${shopName}`,
    content: {
      heading: `Join ${shopName}`,
      paragraphs: [
        `${invitedBy} invites you to ${shopName} on Bookmatch. Your role there: ${ROLE_NAMES[role]}.`,
        'The link works for seven days, once.',
      ],
      action: { label: `Join ${shopName}`, url: `${origin}/accept-invitation?token=${token}` },
      footer: `You get this because ${invitedBy} entered your address. If you do not know them, do nothing.`,
    },
  };
}
