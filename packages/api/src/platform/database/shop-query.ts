import type { EntityManager, ObjectLiteral, SelectQueryBuilder } from 'typeorm';
import type { ColumnMetadata } from 'typeorm/metadata/ColumnMetadata.js';
import { compiled, type Compiled, type Step } from './compiled-query.js';
import type { ShopRow } from './rows.js';

export type QueryStart = { manager: EntityManager; shopId: string };
type Builder = SelectQueryBuilder<ObjectLiteral>;
type RowClass = new () => ShopRow;

/**
 * A read over one shop's rows: lists, sums, look-ups over several tables. The shop is part of the first table's
 * condition and of every join's; nothing here can take it away again.
 *
 * Columns are written `alias.property`. Text that reaches SQL comes from this code only, never from a request: sort keys
 * go through an allow-list, values through parameters. What is asked is only noted down here; the SQL of each shape of
 * query is written once and kept (see `compiled-query.ts`).
 */
export class ShopQuery {
  private readonly steps: Step[] = [];
  private readonly parameters: ObjectLiteral;
  private readonly entities: Map<string, RowClass>;
  private rowLimit: number | undefined;

  private constructor(
    private readonly manager: EntityManager,
    shopId: string,
    private readonly entity: RowClass,
    private readonly alias: string,
  ) {
    this.parameters = { shopId };
    this.entities = new Map([[alias, entity]]);
  }

  static from({ manager, shopId }: QueryStart, entity: RowClass, alias: string): ShopQuery {
    return new ShopQuery(manager, shopId, entity, alias);
  }

  join(entity: RowClass, alias: string, on: string, parameters: ObjectLiteral = {}): this {
    this.entities.set(alias, entity);
    return this.note(`join ${entity.name} ${alias} ${on}`, parameters, (builder) =>
      builder.innerJoin(entity, alias, `${alias}.shopId = :shopId and (${on})`),
    );
  }

  leftJoin(entity: RowClass, alias: string, on: string, parameters: ObjectLiteral = {}): this {
    this.entities.set(alias, entity);
    return this.note(`left join ${entity.name} ${alias} ${on}`, parameters, (builder) =>
      builder.leftJoin(entity, alias, `${alias}.shopId = :shopId and (${on})`),
    );
  }

  /** Joins the shop itself, which is no row of a shop. */
  joinShop(entity: new () => ObjectLiteral, alias: string): this {
    return this.note(`join shop ${entity.name} ${alias}`, {}, (builder) =>
      builder.innerJoin(entity, alias, `${alias}.id = :shopId`),
    );
  }

  /** Chooses what comes back: output key → `alias.property`, read by the column's own kind, or an SQL expression. */
  pick(columns: Record<string, string>): this {
    for (const [output, path] of Object.entries(columns)) {
      const column = () => this.columnAt(path);
      this.note(`pick ${output} ${path}`, {}, (builder, picked) => {
        builder.addSelect(path, output);
        picked.push({ output, column: column() });
      });
    }
    return this;
  }

  /**
   * Adds to each row a figure over another table's rows, such as `{ openQuestions: 'count(*)' }`: a query of its own,
   * so that it multiplies nothing and `count` stays right. Counts and sums come back as numbers or texts of them.
   */
  pickFrom(figure: Record<string, string>, entity: RowClass, alias: string, on: string): this {
    for (const [output, sql] of Object.entries(figure))
      this.note(`pick ${output} ${sql} from ${entity.name} ${alias} ${on}`, {}, (builder) => {
        const inner = builder
          .subQuery()
          .select(sql, output)
          .from(entity, alias)
          .where(`${alias}.shopId = :shopId and (${on})`);
        builder.addSelect(inner.getQuery(), output);
      });
    return this;
  }

  where(sql: string, parameters: ObjectLiteral = {}): this {
    return this.note(`where ${sql}`, parameters, (builder) => builder.andWhere(`(${sql})`));
  }

  groupBy(path: string): this {
    return this.note(`group ${path}`, {}, (builder) => builder.addGroupBy(path));
  }

  orderBy(path: string, direction: 'ASC' | 'DESC' = 'ASC'): this {
    return this.note(`order ${path} ${direction}`, {}, (builder) => builder.addOrderBy(path, direction));
  }

  limit(rows: number): this {
    this.rowLimit = rows;
    return this;
  }

  lock(): this {
    return this.note('lock', {}, (builder) => builder.setLock('pessimistic_write'));
  }

  async all<Row>(): Promise<Row[]> {
    const query = this.compile(`rows ${this.rowLimit ?? 'all'}`, (builder) => builder.limit(this.rowLimit));
    const raw = await this.run<Record<string, unknown>>(query);
    const { driver } = this.manager.connection;
    for (const row of raw)
      for (const { output, column } of query.columns)
        row[output] = driver.prepareHydratedValue(row[output], column) as unknown;
    return raw as Row[];
  }

  async first<Row>(): Promise<Row | null> {
    return (await this.limit(1).all<Row>())[0] ?? null;
  }

  /** How many rows match, without paging. Counts `distinct` when a join multiplies rows. */
  async count(distinct?: string): Promise<number> {
    const what = distinct ? `count(distinct ${distinct})` : 'count(*)';
    const query = this.compile(what, (builder) => builder.orderBy().select(what, 'total'));
    const [row] = await this.run<{ total: number | string }>(query);
    return Number(row?.total ?? 0);
  }

  private note(key: string, parameters: ObjectLiteral, apply: Step['apply']): this {
    Object.assign(this.parameters, parameters);
    this.steps.push({ key, apply });
    return this;
  }

  private compile(key: string, finish: (builder: Builder) => unknown): Compiled {
    return compiled(this.manager, this.entity, this.alias, [...this.steps, { key, apply: finish }]);
  }

  private run<Row>(query: Compiled): Promise<Row[]> {
    const [sql, values] = this.manager.connection.driver.escapeQueryWithParameters(
      query.sql,
      this.parameters,
    );
    return this.manager.query(sql, values as unknown[]);
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
