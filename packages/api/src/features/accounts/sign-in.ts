import type passport from 'passport';
import { Strategy } from 'passport-local';
import type { GlobalScope } from '../../platform/database/scope.js';
import { Person } from './person.entity.js';
import { passwordFits } from './passwords.js';

type Verified = (error: unknown, person?: Person | false) => void;

/**
 * Checks an e-mail address and a password through passport's local strategy, outside of any request, so that the
 * session stays in our own hands. Answers the person or null.
 */
export function verifyCredentials(
  scope: GlobalScope,
  email: string,
  password: string,
): Promise<Person | null> {
  const strategy = new Strategy({ usernameField: 'email' }, (address, secret, done: Verified) => {
    findPerson(scope, address, secret).then((person) => done(null, person ?? false), done);
  });
  return new Promise((resolve, reject) => {
    const attempt = Object.assign(Object.create(strategy) as passport.Strategy, {
      success: (person: unknown) => resolve(person as Person),
      fail: () => resolve(null),
      error: reject,
    });
    strategy.authenticate.call(attempt as unknown as Strategy, { body: { email, password } } as never, {});
  });
}

async function findPerson(scope: GlobalScope, email: string, password: string): Promise<Person | null> {
  const person = await scope.global(Person).findOneBy({ email });
  return (await passwordFits(person?.passwordHash ?? null, password)) ? person : null;
}
