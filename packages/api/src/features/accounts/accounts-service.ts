import type {
  Membership,
  Person as PersonView,
  Session,
  SignUp,
} from '@bookmatch/common/accounts/accounts-contract';
import type { CreateShop } from '@bookmatch/common/shops/shops-contract';
import type { GlobalScope } from '../../platform/database/scope.js';
import { sendMail } from '../../platform/mail/mail.js';
import { enqueue } from '../../platform/outbox/outbox.js';
import { confirmationLetter, knownAddressLetter } from './account-letters.js';
import { hashPassword } from './passwords.js';
import { issueToken, redeemToken } from './person-tokens.js';
import { Person } from './person.entity.js';

/** What `accounts` asks of the slices above it, given by `compose.ts`. */
export type AccountHooks = {
  /** Makes the shop with its first member, and answers its id. */
  createShop(scope: GlobalScope, personId: string, input: CreateShop): Promise<string>;
  membershipsOf(scope: GlobalScope, personId: string): Promise<Membership[]>;
};

/** A sign-up as the outbox holds it: the password is hashed before it is written anywhere. */
export type SignUpRequest = Omit<SignUp, 'password'> & { personId: string; passwordHash: string };
export const SIGN_UP = 'account-sign-up';
export const RESEND_CONFIRMATION = 'account-resend-confirmation';

/** People: signing up, confirming an address, who is signed in. */
export class AccountsService {
  constructor(
    private readonly origin: string,
    private readonly hooks: AccountHooks,
  ) {}

  /**
   * Takes a sign-up in. The outbox carries it out, so that a known and an unknown address get the same answer after the
   * same work: nobody learns who has an account.
   */
  async requestSignUp(scope: GlobalScope, { password, ...input }: SignUp): Promise<void> {
    const passwordHash = await hashPassword(password);
    await enqueue(scope, SIGN_UP, { ...input, personId: scope.newId(), passwordHash });
  }

  /**
   * Makes the person, the shop and the trial, and sends the letter that confirms the address. An address that is known
   * already gets a letter saying so instead. A repeat does nothing.
   */
  async signUp(scope: GlobalScope, request: SignUpRequest): Promise<void> {
    const { personId, name, email, passwordHash, shopName, timeZone, unitSystem } = request;
    const known = await scope.global(Person).findOneBy({ email }, true);
    if (known) {
      if (known.id !== personId) await sendMail(scope, knownAddressLetter(known, this.origin));
      return;
    }
    const values = { id: personId, name, email, passwordHash, emailConfirmedAt: null };
    const person = await scope.global(Person).insert(values);
    await this.hooks.createShop(scope, personId, { shopName, timeZone, unitSystem });
    await this.sendConfirmation(scope, person);
  }

  /** Leaves the look-up to the outbox, for the reason given at `requestSignUp`. */
  async requestConfirmation(scope: GlobalScope, email: string): Promise<void> {
    await enqueue(scope, RESEND_CONFIRMATION, { email });
  }

  /** Sends the confirmation once more, to somebody who signed up and has not confirmed yet. */
  async resendConfirmation(scope: GlobalScope, email: string): Promise<void> {
    const person = await scope.global(Person).findOneBy({ email });
    if (person && !person.emailConfirmedAt) await this.sendConfirmation(scope, person);
  }

  /** Confirms the address that the token was sent to. @throws link-expired */
  async confirmEmail(scope: GlobalScope, token: string): Promise<Person> {
    const person = await redeemToken(scope, token, 'confirm-email');
    return scope.global(Person).update(person, { emailConfirmedAt: person.emailConfirmedAt ?? scope.now });
  }

  async session(scope: GlobalScope, personId: string): Promise<Session> {
    const person = await scope.global(Person).get(personId);
    return { person: viewPerson(person), memberships: await this.hooks.membershipsOf(scope, personId) };
  }

  async rename(scope: GlobalScope, personId: string, name: string): Promise<PersonView> {
    const people = scope.global(Person);
    return viewPerson(await people.update(await people.get(personId, true), { name }));
  }

  /** One more shop for somebody who is signed in, with a trial of its own. */
  async addShop(scope: GlobalScope, personId: string, input: CreateShop): Promise<Membership> {
    const shopId = await this.hooks.createShop(scope, personId, input);
    const memberships = await this.hooks.membershipsOf(scope, personId);
    const membership = memberships.find((one) => one.shopId === shopId);
    if (!membership) throw new TypeError('The new shop has no owner.');
    return membership;
  }

  private async sendConfirmation(scope: GlobalScope, person: Person): Promise<void> {
    const token = await issueToken(scope, person.id, 'confirm-email');
    await sendMail(scope, confirmationLetter(person, this.origin, token));
  }
}

function viewPerson({ id, name, email, emailConfirmedAt }: Person): PersonView {
  return { id, name, email, emailConfirmed: emailConfirmedAt !== null };
}
