import type { Request } from 'express';
import type { LimitKind } from './mount.js';
import type { RateLimits } from './rate-limits.js';

/** What a try is counted against: the network address, the account it is about, and both together. */
type Tried = { address: string; account: string | null };

/**
 * Counts tries on routes where somebody could guess or have letters sent. The account is the address named in the body,
 * or the signed-in person; the network address is that of the connection, whatever forwarding headers say, unless a proxy
 * is configured.
 */
export function tryLimits(limits: RateLimits, personOf: (request: Request) => string | null) {
  const tried = (request: Request): Tried => {
    const { email } = (request.body ?? {}) as { email?: unknown };
    const account = typeof email === 'string' ? email.trim().toLowerCase() : personOf(request);
    return { address: request.ip ?? '', account };
  };
  const pair = ({ address, account }: Tried) => `${address} ${account}`;

  return {
    async limit(kind: LimitKind, request: Request): Promise<void> {
      const who = tried(request);
      await limits.count(`${kind}-address`, who.address);
      if (who.account === null) return;
      if (kind === 'guessing') await limits.count('guessing-pair', pair(who));
      await limits.count(`${kind}-account`, who.account);
    },
    /** Somebody who knows the password may sign in as often as they like from where they are. Letters sent stay counted. */
    async forgive(kind: LimitKind, request: Request): Promise<void> {
      const who = tried(request);
      if (kind === 'guessing' && who.account !== null) await limits.forgive('guessing-pair', pair(who));
    },
  };
}
