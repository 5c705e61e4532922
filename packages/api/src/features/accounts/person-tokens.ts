import type { GlobalScope } from '../../platform/database/scope.js';
import { ProblemError } from '../../platform/http/problem-error.js';
import { hashToken, newToken } from '../../platform/http/secrets.js';
import { PersonToken } from './person-token.entity.js';
import { Person } from './person.entity.js';

const HOUR_MS = 3_600_000;
/** How long the link in each kind of letter works. */
const LIVES_MS = { 'confirm-email': 48 * HOUR_MS, 'reset-password': HOUR_MS } as const;
export type TokenPurpose = keyof typeof LIVES_MS;

/** Makes the secret of a link for a letter. Only its hash is kept. */
export async function issueToken(
  scope: GlobalScope,
  personId: string,
  purpose: TokenPurpose,
): Promise<string> {
  const { token, tokenHash } = newToken();
  const expiresAt = new Date(scope.now.getTime() + LIVES_MS[purpose]);
  await scope
    .global(PersonToken)
    .insert({ id: scope.newId(), personId, purpose, tokenHash, expiresAt, usedAt: null });
  return token;
}

/**
 * Uses a link up and answers whom it was sent to; their other links of the same purpose die with it. Of two who use it
 * at once, one wins: the row is locked.
 *
 * @throws link-expired
 */
export async function redeemToken(scope: GlobalScope, token: string, purpose: TokenPurpose): Promise<Person> {
  const found = await scope.global(PersonToken).findOneBy({ tokenHash: hashToken(token), purpose }, true);
  if (!found || found.usedAt || found.expiresAt <= scope.now)
    throw new ProblemError('link-expired', 'This link was used already or is too old. Ask for a new one.');
  await voidTokens(scope, found.personId, purpose);
  return scope.global(Person).get(found.personId, true);
}

/** Makes every unused link of a purpose worthless. */
export async function voidTokens(scope: GlobalScope, personId: string, purpose: TokenPurpose): Promise<void> {
  const tokens = scope.global(PersonToken);
  const unused = await tokens.findBy({ personId, purpose, usedAt: null }, undefined, true);
  for (const token of unused) await tokens.update(token, { usedAt: scope.now });
}
