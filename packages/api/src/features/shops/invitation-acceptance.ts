import type { AcceptInvitation, InvitationOffer } from '@bookmatch/common/shops/members-contract';
import type { GlobalScope, ShopScope } from '../../platform/database/scope.js';
import type { Stamp } from '../../platform/database/stamp.js';
import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import { conflict, ProblemError } from '../../platform/http/problem-error.js';
import { hashToken } from '../../platform/http/secrets.js';
import { confirmedPerson, hashPassword, openConfirmedAccount, Person } from '../accounts/accounts-public.js';
import { Invitation } from './invitation.entity.js';
import type { MembersService } from './members-service.js';
import { Shop } from './shop.entity.js';

export type AcceptanceHooks = {
  /** Throws when the shop's subscription has lapsed: nobody joins then. */
  refuseLapsed(scope: ShopScope): Promise<void>;
};
type Newcomer = { name: string; passwordHash: string };

/** Invitations as the invited person meets them, by the link from the letter. */
export class InvitationAcceptance {
  constructor(
    private readonly members: MembersService,
    private readonly hooks: AcceptanceHooks,
  ) {}

  /** What the link offers. @throws link-expired */
  async offer(scope: GlobalScope, token: string): Promise<InvitationOffer> {
    const invitation = await find(scope, token);
    if (!invitation || isOver(invitation, scope.now)) throw expired();
    const shop = await scope.global(Shop).get(invitation.shopId);
    const { email, role, expiresAt } = invitation;
    const needsAccount = (await confirmedPerson(scope, email)) === null;
    return { shopName: shop.name, email, role, expiresAt: expiresAt.toISOString(), needsAccount };
  }

  /**
   * Takes the place that is offered, and answers who took it. The link proves the address, so somebody new needs no
   * further confirmation; somebody with an account has to be signed in to it.
   *
   * @param signedInId the person signed in at this browser, if any
   * @throws link-expired, not-signed-in, conflict (signed in as somebody else), invalid-input (name or password missing)
   */
  async accept(
    work: UnitOfWork,
    stamp: Stamp,
    input: AcceptInvitation,
    signedInId: string | null,
  ): Promise<string> {
    const newcomer = await readNewcomer(input);
    return work.transaction(stamp, async (scope) => {
      const found = await find(scope, input.token);
      if (!found) throw expired();
      const inShop = scope.forShop(found.shopId);
      const invitation = await inShop.rows(Invitation).getForUpdate(found.id);
      if (await wasTakenBy(scope, invitation, signedInId)) return signedInId ?? '';
      if (invitation.tokenHash !== found.tokenHash || isOver(invitation, scope.now)) throw expired();
      await this.hooks.refuseLapsed(inShop);
      const person = await this.invited(scope, invitation.email, signedInId, newcomer);
      await this.members.join(inShop, person.id, invitation.role);
      await inShop.rows(Invitation).update(invitation, { acceptedAt: scope.now, openEmail: null });
      return person.id;
    });
  }

  private async invited(
    scope: GlobalScope,
    email: string,
    signedInId: string | null,
    newcomer: Newcomer | null,
  ): Promise<Person> {
    const known = await confirmedPerson(scope, email);
    if (signedInId !== null && known?.id !== signedInId)
      throw conflict(`This invitation is for ${email}. Sign out first, then open it again.`);
    if (known && signedInId === null)
      throw new ProblemError('not-signed-in', `Sign in as ${email} to accept.`);
    if (known) return known;
    if (!newcomer) throw nameless();
    return openConfirmedAccount(scope, { email, ...newcomer });
  }
}

async function readNewcomer({ name, password }: AcceptInvitation): Promise<Newcomer | null> {
  if (name === undefined || password === undefined) return null;
  return { name, passwordHash: await hashPassword(password) };
}

async function find(scope: GlobalScope, token: string): Promise<Invitation | null> {
  const [found] = await scope.acrossShops(Invitation, { tokenHash: hashToken(token) });
  return found ?? null;
}

function isOver({ openEmail, expiresAt }: Invitation, now: Date): boolean {
  return openEmail === null || expiresAt <= now;
}

/** A second click of the person who accepted is no error. */
async function wasTakenBy(
  scope: GlobalScope,
  { acceptedAt, email }: Invitation,
  personId: string | null,
): Promise<boolean> {
  if (acceptedAt === null || personId === null) return false;
  return (await scope.global(Person).get(personId)).email === email;
}

const expired = () =>
  new ProblemError(
    'link-expired',
    'This invitation was used, withdrawn or is too old. Ask the shop to send it again.',
  );
const nameless = () =>
  new ProblemError('invalid-input', 'Enter your name and choose a password.', {
    fields: [
      { path: 'name', message: 'Enter your name.' },
      { path: 'password', message: 'Choose a password.' },
    ],
  });
