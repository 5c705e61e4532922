import { subject } from '@casl/ability';
import type { Ability, Action, Subject } from '@bookmatch/common/access/ability';
import type { EntityManager } from 'typeorm';
import { v7 } from './ids.js';
import { notAllowed, notFound } from '../http/problem-error.js';
import { GlobalRepository } from './global-repository.js';
import { ShopQuery, type QueryStart } from './shop-query.js';
import { addCondition, ShopRepository } from './shop-repository.js';
import type { GlobalRow, ShopRow } from './rows.js';
import type { Stamp } from './stamp.js';

/** The database as a request about no shop sees it: only rows that belong to no shop. */
export class GlobalScope {
  constructor(
    /** For the platform's own tables; a lint rule keeps features from it. */
    readonly manager: EntityManager,
    readonly stamp: Stamp,
  ) {}

  get now(): Date {
    return this.stamp.now;
  }

  newId(): string {
    return v7(this.now);
  }

  global<Row extends GlobalRow>(entity: new () => Row): GlobalRepository<Row> {
    return new GlobalRepository(this.manager, entity, this.stamp);
  }

  /**
   * Finds tenant rows without knowing the shop yet: a person's memberships, the shop behind a webhook or a link. The
   * condition must name something only the asker can know; what is found is then worked on with `forShop`.
   */
  acrossShops<Row extends ShopRow>(
    entity: new () => Row,
    where: Partial<Record<keyof Row & string, string>>,
  ): Promise<Row[]> {
    const builder = this.manager.createQueryBuilder(entity, 'row').where('1 = 1');
    Object.entries(where).forEach(([key, value], index) => addCondition(builder, key, value, index));
    return builder.getMany();
  }

  /** The same transaction, narrowed to one shop. For sign-up, webhooks and other work that finds its shop on the way. */
  forShop(shopId: string, ability?: Ability, timeZone?: string): ShopScope {
    return new ShopScope(this.manager, this.stamp, shopId, ability, timeZone);
  }
}

/**
 * The database as one shop's request sees it. Features get their repositories and queries only from here, so that the
 * shop is part of every read and write without anybody remembering it.
 */
export class ShopScope extends GlobalScope {
  constructor(
    manager: EntityManager,
    stamp: Stamp,
    readonly shopId: string,
    private readonly granted?: Ability,
    /** The shop's IANA zone, where it was read with the membership. */
    readonly timeZone?: string,
  ) {
    super(manager, stamp);
  }

  override global<Row extends GlobalRow>(entity: new () => Row): GlobalRepository<Row> {
    return new GlobalRepository(this.manager, entity, this.stamp, this.shopId);
  }

  rows<Row extends ShopRow>(entity: new () => Row): ShopRepository<Row> {
    return new ShopRepository(this.manager, entity, this.shopId, this.stamp);
  }

  query<Row extends ShopRow>(entity: new () => Row, alias: string): ShopQuery {
    const start: QueryStart = { manager: this.manager, shopId: this.shopId };
    return ShopQuery.from(start, entity, alias);
  }

  get ability(): Ability {
    if (!this.granted) throw notAllowed();
    return this.granted;
  }

  /** The acting member's id. Only requests of members have one. */
  get memberId(): string {
    if (this.stamp.author.kind !== 'member') throw notAllowed();
    return this.stamp.author.memberId;
  }

  can(action: Action, of: Subject, fieldGroup?: string): boolean {
    return this.ability.can(action, of, fieldGroup);
  }

  /**
   * Checks the loaded row itself. A row the actor may not even read answers 404, like one that does not exist; a row
   * they may read but not act on answers 403.
   */
  check(action: Action, of: Subject, row: object): void {
    const checked = subject(of, { ...row }) as unknown as Parameters<Ability['can']>[1];
    if (this.ability.can(action, checked)) return;
    throw action === 'read' || !this.ability.can('read', checked) ? notFound() : notAllowed();
  }
}
