import type { Product } from '@bookmatch/api/compose';
import { ShopScope, type GlobalScope } from '@bookmatch/api/platform/database/scope';
import { systemStamp, type Author, type Stamp } from '@bookmatch/api/platform/database/stamp';
import type { Platform } from '@bookmatch/api/platform/platform';
import { defineAbility } from '@bookmatch/common/access/ability';
import type { Role } from '@bookmatch/common/access/roles';
import type { Person } from '../cast/people.js';

/** Somebody's place in the shop, with the ids that the services gave them. */
export type Seat = { personId: string; memberId: string; role: Role };
export type Services = Product['services'];

/** What every change of the demo is stamped with, so that the audit trail tells it from what people did. */
export const DEMO = 'demo';

/** Everything needed to act in one shop, as its members and customers would, at any moment of its past. */
export class Desk {
  /** By e-mail address. */
  private readonly seats = new Map<string, Seat>();
  private readonly operations = new Map<string, string>();

  constructor(
    readonly platform: Platform,
    readonly services: Services,
    readonly shopId: string,
    readonly zone: string,
  ) {}

  seat({ email }: Person, seat: Seat): void {
    this.seats.set(email, seat);
  }

  seatOf({ email }: Person): Seat {
    return known(this.seats.get(email), email);
  }

  nameOperations(operations: readonly { id: string; name: string }[]): void {
    for (const { id, name } of operations) this.operations.set(name, id);
  }

  operationId(name: string): string {
    return known(this.operations.get(name), name);
  }

  stampOf(person: Person, at: Date): Stamp {
    return { author: { kind: 'member', ...this.seatOf(person) }, requestId: DEMO, now: at };
  }

  /** One transaction of the shop, as a member. */
  as<Result>(person: Person, at: Date, work: (scope: ShopScope) => Promise<Result>): Promise<Result> {
    return this.platform.work.transaction(this.stampOf(person, at), (scope) =>
      work(this.memberScope(scope, person, at)),
    );
  }

  /** The same transaction, seen by a member at another moment of it. */
  memberScope({ manager }: GlobalScope, person: Person, at: Date): ShopScope {
    const { memberId, role } = this.seatOf(person);
    const ability = defineAbility({ memberId, role });
    return new ShopScope(manager, this.stampOf(person, at), this.shopId, ability, this.zone);
  }

  /** The same transaction, seen by a customer behind their link, or by the system. Both may what the services let them. */
  outsideScope({ manager, now }: GlobalScope, author: Exclude<Author, { kind: 'member' }>): ShopScope {
    return new ShopScope(manager, { author, requestId: DEMO, now }, this.shopId, undefined, this.zone);
  }
}

export const systemAt = (at: Date): Stamp => systemStamp(DEMO, at);

function known<Value>(value: Value | undefined, name: string): Value {
  if (value === undefined) throw new RangeError(`${name} is not known in this shop.`);
  return value;
}
