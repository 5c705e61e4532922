import type { Session, SignUp } from '@bookmatch/common/accounts/accounts-contract';
import type { GlobalScope } from '../../platform/database/scope.js';
import { hashToken, newToken } from '../../platform/http/secrets.js';
import { ProblemError } from '../../platform/http/problem-error.js';
import { sendMail } from '../../platform/mail/mail.js';
import { hashPassword } from './passwords.js';
import { PersonToken } from './person-token.entity.js';
import { Person } from './person.entity.js';

const HOUR_MS = 3_600_000;
const CONFIRM_MS = 48 * HOUR_MS;

/** What `accounts` asks of the slices above it, given by `compose.ts`. */
export type AccountHooks = {
  /** Makes the shop with its first member. */
  createShop(scope: GlobalScope, personId: string, input: SignUp): Promise<void>;
  membershipsOf(scope: GlobalScope, personId: string): Promise<Session['memberships']>;
};

/** People: signing up, confirming an address, who is signed in. */
export class AccountsService {
  constructor(
    private readonly origin: string,
    private readonly hooks: AccountHooks,
  ) {}

  /**
   * Makes the person, the shop and the trial. An address that is known already gets a letter saying so instead; the
   * answer is the same, so that nobody learns who has an account.
   */
  async signUp(scope: GlobalScope, input: SignUp): Promise<void> {
    const passwordHash = await hashPassword(input.password);
    const { name, email } = input;
    const known = await scope.global(Person).findOneBy({ email }, true);
    if (known) {
      await this.sendKnownAddress(scope, known);
      return;
    }
    const person = await scope
      .global(Person)
      .insert({ id: scope.newId(), name, email, passwordHash, emailConfirmedAt: null });
    await this.hooks.createShop(scope, person.id, input);
    await this.sendConfirmation(scope, person);
  }

  /** Confirms the address that the token was sent to. @throws link-expired */
  async confirmEmail(scope: GlobalScope, token: string): Promise<Person> {
    const person = await this.redeem(scope, token, 'confirm-email');
    return scope.global(Person).update(person, { emailConfirmedAt: person.emailConfirmedAt ?? scope.now });
  }

  async session(scope: GlobalScope, personId: string): Promise<Session> {
    const person = await scope.global(Person).get(personId);
    const { id, name, email, emailConfirmedAt } = person;
    return {
      person: { id, name, email, emailConfirmed: emailConfirmedAt !== null },
      memberships: await this.hooks.membershipsOf(scope, personId),
    };
  }

  async sendConfirmation(scope: GlobalScope, person: Person): Promise<void> {
    const token = await this.issueToken(scope, person, 'confirm-email', CONFIRM_MS);
    await sendMail(scope, {
      to: person.email,
      fromName: 'Bookmatch',
      subject: 'Confirm your e-mail address',
      content: {
        heading: `Welcome, ${person.name}`,
        paragraphs: ['Confirm your e-mail address to open your shop. The link works for two days, once.'],
        action: { label: 'Confirm and open my shop', url: `${this.origin}/confirm-email?token=${token}` },
        footer: 'You get this because somebody signed up with this address. If it was not you, do nothing.',
      },
    });
  }

  private async sendKnownAddress(scope: GlobalScope, person: Person): Promise<void> {
    await sendMail(scope, {
      to: person.email,
      fromName: 'Bookmatch',
      subject: 'You have an account already',
      content: {
        heading: `Hello ${person.name}`,
        paragraphs: [
          'Somebody signed up with this address, which has an account already. Nothing was changed.',
          'Sign in to open your shop, or to add another one.',
        ],
        action: { label: 'Sign in', url: `${this.origin}/sign-in` },
        footer: 'If it was not you, do nothing.',
      },
    });
  }

  private async issueToken(
    scope: GlobalScope,
    person: Person,
    purpose: string,
    lifeMs: number,
  ): Promise<string> {
    const { token, tokenHash } = newToken();
    const expiresAt = new Date(scope.now.getTime() + lifeMs);
    await scope
      .global(PersonToken)
      .insert({ id: scope.newId(), personId: person.id, purpose, tokenHash, expiresAt, usedAt: null });
    return token;
  }

  private async redeem(scope: GlobalScope, token: string, purpose: string): Promise<Person> {
    const tokens = scope.global(PersonToken);
    const found = await tokens.findOneBy({ tokenHash: hashToken(token), purpose }, true);
    if (!found || found.usedAt || found.expiresAt <= scope.now)
      throw new ProblemError('link-expired', 'This link was used already or is too old. Ask for a new one.');
    await tokens.update(found, { usedAt: scope.now });
    return scope.global(Person).get(found.personId);
  }
}
