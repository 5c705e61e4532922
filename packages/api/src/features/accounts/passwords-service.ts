import type { ChangePassword, ResetPassword } from '@bookmatch/common/accounts/accounts-contract';
import type { GlobalScope } from '../../platform/database/scope.js';
import type { Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import { invalid } from '../../platform/http/problem-error.js';
import { sendMail } from '../../platform/mail/mail.js';
import { enqueue } from '../../platform/outbox/outbox.js';
import { endSessions } from '../../platform/sessions/end-sessions.js';
import { passwordChangedLetter, resetLetter } from './account-letters.js';
import { hashPassword, passwordFits } from './passwords.js';
import { issueToken, redeemToken, voidTokens } from './person-tokens.js';
import { Person } from './person.entity.js';

export const RESET_PASSWORD = 'account-reset-password';

/** Passwords: forgotten ones and changed ones. Whoever knew the old one is signed out by the same transaction. */
export class PasswordsService {
  constructor(private readonly origin: string) {}

  /** Leaves the look-up to the outbox: a known and an unknown address take the same work and the same time. */
  async requestReset(scope: GlobalScope, email: string): Promise<void> {
    await enqueue(scope, RESET_PASSWORD, { email });
  }

  async sendReset(scope: GlobalScope, email: string): Promise<void> {
    const person = await scope.global(Person).findOneBy({ email });
    if (!person) return;
    const token = await issueToken(scope, person.id, 'reset-password');
    await sendMail(scope, resetLetter(person, this.origin, token));
  }

  /** Sets a new password by the link from the letter, which also proves the address. @throws link-expired */
  async reset(work: UnitOfWork, stamp: Stamp, { token, password }: ResetPassword): Promise<void> {
    const passwordHash = await hashPassword(password);
    await work.transaction(stamp, async (scope) => {
      const person = await redeemToken(scope, token, 'reset-password');
      const emailConfirmedAt = person.emailConfirmedAt ?? scope.now;
      await scope.global(Person).update(person, { passwordHash, emailConfirmedAt });
      await endSessions(scope, person.id);
      await sendMail(scope, passwordChangedLetter(person, this.origin));
    });
  }

  /**
   * Changes the password of somebody signed in and signs them out everywhere else.
   *
   * @param keepSid the session that asks
   * @throws invalid-input when the current password does not fit
   */
  async change(
    work: UnitOfWork,
    stamp: Stamp,
    asker: { personId: string; keepSid: string },
    { currentPassword, newPassword }: ChangePassword,
  ): Promise<void> {
    const seen = await work.read(stamp, (scope) => scope.global(Person).get(asker.personId));
    if (!(await passwordFits(seen.passwordHash, currentPassword))) throw wrongPassword();
    const passwordHash = await hashPassword(newPassword);
    await work.transaction(stamp, async (scope) => {
      const person = await scope.global(Person).get(asker.personId, true);
      // Somebody changed it while the hashes were computed: what was checked is no longer the current one.
      if (person.passwordHash !== seen.passwordHash) throw wrongPassword();
      await scope.global(Person).update(person, { passwordHash });
      await endSessions(scope, person.id, asker.keepSid);
      await voidTokens(scope, person.id, 'reset-password');
      await sendMail(scope, passwordChangedLetter(person, this.origin));
    });
  }
}

const wrongPassword = () => invalid('currentPassword', 'This is not your current password.');
