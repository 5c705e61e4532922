import type { Letter } from '../../platform/mail/mail.js';

/** The letters to a person about their account. Links go to the configured origin only. */

type To = { email: string; name: string };
const from = ({ email }: To) => ({ to: email, fromName: 'Bookmatch' });

export function confirmationLetter(person: To, origin: string, token: string): Letter {
  return {
    ...from(person),
    subject: 'Confirm your e-mail address',
    content: {
      heading: `Welcome, ${person.name}`,
      paragraphs: ['Confirm your e-mail address to open your shop. The link works for two days, once.'],
      action: { label: 'Confirm and open my shop', url: `${origin}/confirm-email?token=${token}` },
      footer: 'You get this because somebody signed up with this address. If it was not you, do nothing.',
    },
  };
}

export function knownAddressLetter(person: To, origin: string): Letter {
  return {
    ...from(person),
    subject: 'You have an account already',
    content: {
      heading: `Hello ${person.name}`,
      paragraphs: [
        'Somebody signed up with this address, which has an account already. Nothing was changed.',
        'Sign in to open your shop, or to add another one.',
      ],
      action: { label: 'Sign in', url: `${origin}/sign-in` },
      footer: 'If it was not you, do nothing.',
    },
  };
}

export function resetLetter(person: To, origin: string, token: string): Letter {
  return {
    ...from(person),
    subject: 'Choose a new password',
    content: {
      heading: `Hello ${person.name}`,
      paragraphs: [
        'Somebody, most likely you, asked for a new password. The link works for an hour, once.',
        'Once you have chosen it, you are signed out everywhere and sign in with the new one.',
      ],
      action: { label: 'Choose a new password', url: `${origin}/reset-password?token=${token}` },
      footer: 'If it was not you, do nothing: your password stays as it is.',
    },
  };
}

export function passwordChangedLetter(person: To, origin: string): Letter {
  return {
    ...from(person),
    subject: 'Your password was changed',
    content: {
      heading: `Hello ${person.name}`,
      paragraphs: [
        'The password of your account was changed, and every other place you were signed in was signed out.',
        'If it was not you, choose a new password at once: whoever did it can read your e-mail or knew your password.',
      ],
      action: { label: 'Choose a new password', url: `${origin}/forgot-password` },
      footer: 'If it was you, there is nothing to do.',
    },
  };
}
