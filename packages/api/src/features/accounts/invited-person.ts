import type { GlobalScope } from '../../platform/database/scope.js';
import { Person } from './person.entity.js';

/** Somebody who can sign in under this address. An account that was never confirmed does not count: nobody has proven it. */
export async function confirmedPerson(scope: GlobalScope, email: string): Promise<Person | null> {
  const person = await scope.global(Person).findOneBy({ email });
  return person?.emailConfirmedAt ? person : null;
}

/**
 * Opens the account of somebody who proved an address by a link we sent there. If somebody signed up with that address
 * and never confirmed it, whoever that was loses it: their password is replaced.
 */
export async function openConfirmedAccount(
  scope: GlobalScope,
  values: { email: string; name: string; passwordHash: string },
): Promise<Person> {
  const people = scope.global(Person);
  const unconfirmed = await people.findOneBy({ email: values.email }, true);
  const confirmed = { ...values, emailConfirmedAt: scope.now };
  if (unconfirmed) return people.update(unconfirmed, confirmed);
  return people.insert({ ...confirmed, id: scope.newId() });
}
