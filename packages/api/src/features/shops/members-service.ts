import type { Role } from '@bookmatch/common/access/roles';
import { refuseLosingLastOwner } from '@bookmatch/common/shops/last-owner';
import type { Member as MemberView } from '@bookmatch/common/shops/members-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { notFound, refuse } from '../../platform/http/problem-error.js';
import { Person } from '../accounts/accounts-public.js';
import { Member } from './member.entity.js';

/** What `shops` tells the slices above it, given by `compose.ts`. */
export type MemberHooks = {
  /** There are more or fewer members than before. Runs in the transaction that changed it. */
  membersChanged(scope: ShopScope): Promise<void>;
  /** A member is leaving. Runs in the transaction that removes them. */
  memberLeaves(scope: ShopScope, memberId: string): Promise<void>;
};

/** Who belongs to the shop, and as what. Their rights are read at every request, so a change holds from the next one on. */
export class MembersService {
  constructor(private readonly hooks: MemberHooks) {}

  async list(scope: ShopScope): Promise<{ rows: MemberView[] }> {
    const members = await scope.rows(Member).findBy({ removedAt: null }, 'createdAt');
    const ids = members.map(({ personId }) => personId);
    const people = new Map((await scope.global(Person).findBy({ id: ids })).map((one) => [one.id, one]));
    return { rows: members.map((member) => view(scope, member, people.get(member.personId))) };
  }

  async changeRole(scope: ShopScope, id: string, role: Role, version: number): Promise<MemberView> {
    const member = await this.lock(scope, id);
    if (member.role === 'owner') await this.refuseIfLastOwner(scope, id, role);
    return this.viewed(scope, await scope.rows(Member).update(member, { role }, version));
  }

  /** What an hour costs from now on. Time already clocked keeps its cost. */
  async setLaborCost(
    scope: ShopScope,
    id: string,
    laborCostCentsPerHour: number | null,
    version: number,
  ): Promise<MemberView> {
    const member = await this.lock(scope, id);
    return this.viewed(scope, await scope.rows(Member).update(member, { laborCostCentsPerHour }, version));
  }

  /** The row stays, since time and changes point at it; the person is out from their next request on. */
  async remove(scope: ShopScope, id: string, version: number): Promise<void> {
    const member = await this.lock(scope, id);
    if (member.role === 'owner') await this.refuseIfLastOwner(scope, id, null);
    await this.hooks.memberLeaves(scope, id);
    await scope.rows(Member).update(member, { removedAt: scope.now }, version);
    await this.hooks.membersChanged(scope);
  }

  /** Takes a person in, or in again. Somebody who is a member already keeps the role they have. */
  async join(scope: ShopScope, personId: string, role: Role): Promise<void> {
    const members = scope.rows(Member);
    const known = await members.findOneBy({ personId }, true);
    if (known && known.removedAt === null) return;
    if (known) await members.update(known, { role, removedAt: null });
    else
      await members.insert({
        id: scope.newId(),
        personId,
        role,
        laborCostCentsPerHour: null,
        removedAt: null,
      });
    await this.hooks.membersChanged(scope);
  }

  private async lock(scope: ShopScope, id: string): Promise<Member> {
    const member = await scope.rows(Member).getForUpdate(id);
    if (member.removedAt !== null) throw notFound('This member');
    return member;
  }

  /** Locks all owners: of two who remove each other at once, the second finds one owner left. */
  private async refuseIfLastOwner(scope: ShopScope, id: string, becomes: Role | null): Promise<void> {
    const owners = await scope.rows(Member).findBy({ role: 'owner', removedAt: null }, undefined, true);
    refuse(
      refuseLosingLastOwner(
        owners.map((owner) => owner.id),
        id,
        becomes,
      ),
    );
  }

  private async viewed(scope: ShopScope, member: Member): Promise<MemberView> {
    return view(scope, member, await scope.global(Person).get(member.personId));
  }
}

function view(scope: ShopScope, member: Member, person: Person | undefined): MemberView {
  const { id, version, personId, role, createdAt, laborCostCentsPerHour } = member;
  return {
    id,
    version,
    personId,
    name: person?.name ?? '',
    email: person?.email ?? '',
    role,
    joinedAt: createdAt.toISOString(),
    ...(scope.can('read', 'Member', 'money') ? { laborCostCentsPerHour } : {}),
  };
}
