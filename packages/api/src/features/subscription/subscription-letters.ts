import { PLAN } from '@bookmatch/common/subscription/plan';
import type { Letter } from '../../platform/mail/mail.js';

/** Letters to the owners about the shop's own subscription. */

type About = { email: string; name: string; shopName: string; url: string };
const FOOTER = 'You get this because you are an owner of this shop on Bookmatch.';

function letter(
  { email, url }: About,
  subject: string,
  heading: string,
  says: string[],
  label: string,
): Letter {
  return {
    to: email,
    fromName: 'Bookmatch',
    subject,
    content: { heading, paragraphs: says, action: { label, url }, footer: FOOTER },
  };
}

export function trialEndingLetter(about: About, lastDay: string): Letter {
  return letter(
    about,
    `The trial of ${about.shopName} ends on ${lastDay}`,
    `Hello ${about.name}`,
    [
      `The trial of ${about.shopName} ends on ${lastDay}.`,
      'Subscribe to go on without a break. Days left of the trial are not lost: the first payment is due when it ends.',
      'If you do nothing, everything stays where it is and can be read and exported; nothing can be changed.',
    ],
    'Subscribe',
  );
}

export function trialEndedLetter(about: About): Letter {
  return letter(
    about,
    `The trial of ${about.shopName} has ended`,
    `Hello ${about.name}`,
    [
      `The trial of ${about.shopName} has ended. Everything is still there and can be read and exported.`,
      'Subscribe to go on where you stopped.',
    ],
    'Subscribe',
  );
}

export function paymentFailedLetter(about: About): Letter {
  return letter(
    about,
    `A payment for ${about.shopName} did not go through`,
    `Hello ${about.name}`,
    [
      `The payment for the subscription of ${about.shopName} did not go through.`,
      `The shop keeps working for ${PLAN.graceDays} days. After that everything can be read and exported, and nothing changed, until it is paid.`,
    ],
    'Pay or change the card',
  );
}
