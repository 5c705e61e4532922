import type { EntityManager, ObjectLiteral, SelectQueryBuilder } from 'typeorm';
import type { ColumnMetadata } from 'typeorm/metadata/ColumnMetadata.js';
import type { ShopRow } from './rows.js';

export type QueryStart = { manager: EntityManager; shopId: string };
type Picked = { output: string; column: ColumnMetadata | null };

/**
 * A read over one shop's rows: lists, sums, look-ups over several tables. The shop is part of the first table's
 * condition and of every join's; nothing here can take it away again.
 *
 * Columns are written `alias.property`. Text that reaches SQL comes from this code only, never from a request: sort keys
 * go through an allow-list, values through parameters.
 */
export class ShopQuery {
  private readonly picked: Picked[] = [];

  private constructor(
    private readonly builder: SelectQueryBuilder<ObjectLiteral>,
    private readonly manager: EntityManager,
    private readonly entities: Map<string, new () => ShopRow>,
  ) {}

  static from(start: QueryStart, entity: new () => ShopRow, alias: string): ShopQuery {
    const builder = start.manager
      .createQueryBuilder(entity as new () => ObjectLiteral, alias)
      .where(`${alias}.shopId = :shopId`, { shopId: start.shopId })
      .select([]);
    return new ShopQuery(builder, start.manager, new Map([[alias, entity]]));
  }

  join(entity: new () => ShopRow, alias: string, on: string, parameters: ObjectLiteral = {}): this {
    this.entities.set(alias, entity);
    this.builder.innerJoin(entity, alias, `${alias}.shopId = :shopId and (${on})`, parameters);
    return this;
  }

  leftJoin(entity: new () => ShopRow, alias: string, on: string, parameters: ObjectLiteral = {}): this {
    this.entities.set(alias, entity);
    this.builder.leftJoin(entity, alias, `${alias}.shopId = :shopId and (${on})`, parameters);
    return this;
  }

  /** Chooses what comes back: output key → `alias.property`, read by the column's own kind, or an SQL expression. */
  pick(columns: Record<string, string>): this {
    for (const [output, path] of Object.entries(columns)) {
      const column = this.columnAt(path);
      this.picked.push({ output, column });
      this.builder.addSelect(path, output);
    }
    return this;
  }

  where(sql: string, parameters: ObjectLiteral = {}): this {
    this.builder.andWhere(`(${sql})`, parameters);
    return this;
  }

  groupBy(path: string): this {
    this.builder.addGroupBy(path);
    return this;
  }

  orderBy(path: string, direction: 'ASC' | 'DESC' = 'ASC'): this {
    this.builder.addOrderBy(path, direction);
    return this;
  }

  limit(rows: number): this {
    this.builder.limit(rows);
    return this;
  }

  lock(): this {
    this.builder.setLock('pessimistic_write');
    return this;
  }

  async all<Row>(): Promise<Row[]> {
    const raw = await this.builder.getRawMany<Record<string, unknown>>();
    const driver = this.manager.connection.driver;
    const read = this.picked.filter(
      (pick): pick is Picked & { column: ColumnMetadata } => pick.column !== null,
    );
    for (const row of raw)
      for (const { output, column } of read)
        row[output] = driver.prepareHydratedValue(row[output], column) as unknown;
    return raw as Row[];
  }

  async first<Row>(): Promise<Row | null> {
    return (await this.limit(1).all<Row>())[0] ?? null;
  }

  /** How many rows match, without paging. Counts `distinct` when a join multiplies rows. */
  async count(distinct?: string): Promise<number> {
    const counted = this.builder.clone().orderBy().limit(undefined);
    const row = await counted
      .select(distinct ? `count(distinct ${distinct})` : 'count(*)', 'total')
      .getRawOne<{ total: number | string }>();
    return Number(row?.total ?? 0);
  }

  private columnAt(path: string): ColumnMetadata | null {
    const [alias, property] = path.split('.');
    const entity = alias === undefined ? undefined : this.entities.get(alias);
    if (!entity || property === undefined || !/^\w+\.\w+$/.test(path)) return null;
    const column = this.manager.connection.getMetadata(entity).findColumnWithPropertyName(property);
    if (!column) throw new TypeError(`There is no ${path}.`);
    return column;
  }
}
