import type { Invitation as InvitationView, Invite } from '@bookmatch/common/shops/members-contract';
import { isDuplicateKey } from '../../platform/database/retry.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound, ProblemError } from '../../platform/http/problem-error.js';
import { newToken } from '../../platform/http/secrets.js';
import { sendMail } from '../../platform/mail/mail.js';
import { Person } from '../accounts/accounts-public.js';
import { invitationLetter } from './invitation-letter.js';
import { Invitation } from './invitation.entity.js';
import { memberNames } from './member-names.js';
import { Member } from './member.entity.js';
import { Shop } from './shop.entity.js';

const LIFE_MS = 7 * 24 * 3_600_000;
const MOST_OPEN = 50;
const RESEND_PAUSE_MS = 60_000;

/** Invitations as the shop handles them; `InvitationAcceptance` is the other end. */
export class InvitationsService {
  constructor(private readonly origin: string) {}

  /** Those neither accepted nor withdrawn, expired ones included: they can be sent again. */
  async list(scope: ShopScope): Promise<{ rows: InvitationView[] }> {
    const names = await memberNames(scope);
    const open = await this.open(scope);
    return { rows: open.map((one) => view(one, names.get(one.invitedByMemberId) ?? '')) };
  }

  async invite(scope: ShopScope, { email, role }: Invite): Promise<InvitationView> {
    await this.refuseMember(scope, email);
    if ((await this.open(scope)).length >= MOST_OPEN)
      throw conflict(`At most ${MOST_OPEN} invitations can be open. Withdraw some first.`);
    const { token, ...sent } = this.fresh(scope);
    const values = { id: scope.newId(), email, openEmail: email, role, acceptedAt: null, withdrawnAt: null };
    const inserting = scope
      .rows(Invitation)
      .insert({ ...values, ...sent, invitedByMemberId: scope.memberId });
    const row = await inserting.catch((error: unknown) => {
      throw isDuplicateKey(error)
        ? conflict('This address is invited already. Send that invitation again, or withdraw it first.')
        : error;
    });
    return this.post(scope, row, token);
  }

  /** Makes a new link; the one sent before ends. */
  async resend(scope: ShopScope, id: string): Promise<InvitationView> {
    const row = await this.lockOpen(scope, id);
    const waitMs = row.sentAt.getTime() + RESEND_PAUSE_MS - scope.now.getTime();
    if (waitMs > 0) throw tooSoon(Math.ceil(waitMs / 1000));
    const { token, ...sent } = this.fresh(scope);
    return this.post(scope, await scope.rows(Invitation).update(row, sent), token);
  }

  async withdraw(scope: ShopScope, id: string): Promise<void> {
    const row = await this.lockOpen(scope, id);
    await scope.rows(Invitation).update(row, { withdrawnAt: scope.now, openEmail: null });
  }

  private open(scope: ShopScope): Promise<Invitation[]> {
    return scope.rows(Invitation).findBy({ acceptedAt: null, withdrawnAt: null }, 'sentAt');
  }

  private async lockOpen(scope: ShopScope, id: string): Promise<Invitation> {
    const row = await scope.rows(Invitation).getForUpdate(id);
    if (row.openEmail === null) throw notFound('This invitation');
    return row;
  }

  private async refuseMember(scope: ShopScope, email: string): Promise<void> {
    const person = await scope.global(Person).findOneBy({ email });
    if (!person) return;
    const member = await scope.rows(Member).findOneBy({ personId: person.id, removedAt: null });
    if (member) throw conflict('Somebody with this address is a member already.');
  }

  private fresh(scope: ShopScope) {
    return { ...newToken(), sentAt: scope.now, expiresAt: new Date(scope.now.getTime() + LIFE_MS) };
  }

  private async post(scope: ShopScope, row: Invitation, token: string): Promise<InvitationView> {
    const shop = await scope.global(Shop).get(scope.shopId);
    const names = await memberNames(scope);
    const invitedBy = names.get(scope.memberId) ?? '';
    const letter = { email: row.email, role: row.role, shopName: shop.name, invitedBy };
    await sendMail(scope, invitationLetter(letter, this.origin, token));
    return view(row, names.get(row.invitedByMemberId) ?? '');
  }
}

function view({ id, email, role, sentAt, expiresAt }: Invitation, invitedBy: string): InvitationView {
  const times = { sentAt: sentAt.toISOString(), expiresAt: expiresAt.toISOString() };
  return { id, email, role, invitedBy, ...times };
}

function tooSoon(seconds: number): ProblemError {
  return new ProblemError('too-many-requests', `It was sent just now. Wait ${seconds} seconds.`, {
    headers: { 'Retry-After': String(seconds) },
  });
}
