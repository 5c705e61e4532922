import type { GlobalScope } from '../../platform/database/scope.js';
import { ProblemError } from '../../platform/http/problem-error.js';
import { Person } from './person.entity.js';

/** Somebody who can sign in under this address. An account that was never confirmed does not count: nobody has proven it. */
export async function confirmedPerson(scope: GlobalScope, email: string): Promise<Person | null> {
  const person = await scope.global(Person).findOneBy({ email });
  return person?.emailConfirmedAt ? person : null;
}

/**
 * Opens the account of somebody who proved an address by a link we sent there. If somebody signed up with that address
 * and never confirmed it, whoever that was loses it: their password is replaced.
 *
 * @throws not-signed-in when the address was confirmed in the meantime: then the account is its owner's
 */
export async function openConfirmedAccount(
  scope: GlobalScope,
  values: { email: string; name: string; passwordHash: string },
): Promise<Person> {
  const people = scope.global(Person);
  const known = await people.findOneBy({ email: values.email }, true);
  if (known?.emailConfirmedAt)
    throw new ProblemError('not-signed-in', `Sign in as ${values.email} to accept.`);
  const confirmed = { ...values, emailConfirmedAt: scope.now };
  if (known) return people.update(known, confirmed);
  return people.insert({ ...confirmed, id: scope.newId() });
}
