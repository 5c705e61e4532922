import type { EntityManager } from 'typeorm';
import { notFound, ProblemError } from '../http/problem-error.js';
import { difference, recordChanges, type Change } from './audit.js';
import type { EditableRow, ShopRow } from './rows.js';
import type { Stamp } from './stamp.js';
import { deleteRow, insertRows, updateRow } from './statements.js';

type Plain = Record<string, unknown>;
type Keys = 'shopId' | 'createdAt' | 'version' | 'updatedAt';
/** What a caller gives to insert a row: everything but what the repository sets itself. */
export type NewRow<Row> = Omit<Row, Keys>;
export type Patch<Row> = Partial<Omit<Row, Keys | 'id'>>;
type Where<Row> = { [Key in keyof Omit<Row, 'shopId'>]?: Row[Key] | readonly Row[Key][] | null };

/** Reads and writes the rows of one entity in one shop. Every write leaves an audit row in the same transaction. */
export class ShopRepository<Row extends ShopRow> {
  constructor(
    private readonly manager: EntityManager,
    private readonly entity: new () => Row,
    private readonly shopId: string,
    private readonly stamp: Stamp,
  ) {}

  find(id: string): Promise<Row | null> {
    return this.select({ id } as Where<Row>).getOne();
  }

  async get(id: string): Promise<Row> {
    return (await this.find(id)) ?? this.missing();
  }

  /** Reads and locks the row until the transaction ends: for every decision that depends on its current state. */
  async getForUpdate(id: string): Promise<Row> {
    const row = await this.select({ id } as Where<Row>)
      .setLock('pessimistic_write')
      .getOne();
    return row ?? this.missing();
  }

  /** All rows that match, in the given order. For bounded sets such as an estimate's lines; lists use `ShopQuery`. */
  findBy(where: Where<Row>, orderBy?: keyof Row & string, lock = false): Promise<Row[]> {
    const builder = this.select(where);
    if (orderBy) builder.orderBy(`row.${orderBy}`).addOrderBy('row.id');
    if (lock) builder.setLock('pessimistic_write');
    return builder.getMany();
  }

  async findOneBy(where: Where<Row>, lock = false): Promise<Row | null> {
    return (await this.findBy(where, undefined, lock))[0] ?? null;
  }

  /** Inserts and returns the row. @throws the driver's duplicate-key error (see `isDuplicateKey`) */
  async insert(values: NewRow<Row>): Promise<Row> {
    const row = this.complete(values);
    await insertRows(this.manager, this.entity, [row]);
    await this.record({ action: 'insert', rowId: row.id, after: row });
    return row;
  }

  async insertMany(rows: readonly NewRow<Row>[]): Promise<Row[]> {
    const complete = rows.map((values) => this.complete(values));
    if (complete.length === 0) return [];
    await insertRows(this.manager, this.entity, complete);
    await this.record(...complete.map((row) => ({ action: 'insert' as const, rowId: row.id, after: row })));
    return complete;
  }

  /**
   * Changes a row that was read in this transaction and returns it as changed. Nothing is written when nothing differs.
   * @param expectedVersion the version the person saw; left out by work that locked the row itself
   * @throws stale-version if somebody changed it meanwhile
   */
  async update(row: Row, patch: Patch<Row>, expectedVersion?: number): Promise<Row> {
    this.requireVersion(row, expectedVersion);
    const { before, after } = difference(row as unknown as Plain, patch as Plain);
    if (Object.keys(after).length === 0) return row;
    const editable = this.isEditable(row);
    const bookkeeping = editable ? { version: row.version + 1, updatedAt: this.stamp.now } : {};
    const keys = editable ? { ...this.keys(row), version: row.version } : this.keys(row);
    const changed = await updateRow(this.manager, this.entity, keys, { ...after, ...bookkeeping });
    if (changed !== 1) throw staleVersion(row);
    await this.record({ action: 'update', rowId: row.id, before, after });
    return Object.assign(Object.create(Object.getPrototypeOf(row) as object) as Row, row, after, bookkeeping);
  }

  /**
   * Counts a change of what belongs to the row, such as an invoice's lines, as a change of the row: who saw the version
   * before has not seen it. The change itself stands in the audit rows of what was changed.
   */
  async touch(row: Row & EditableRow): Promise<Row> {
    const bookkeeping = { version: row.version + 1, updatedAt: this.stamp.now };
    const keys = { ...this.keys(row), version: row.version };
    if ((await updateRow(this.manager, this.entity, keys, bookkeeping)) !== 1) throw staleVersion(row);
    return Object.assign(Object.create(Object.getPrototypeOf(row) as object) as Row, row, bookkeeping);
  }

  async delete(row: Row, expectedVersion?: number): Promise<void> {
    this.requireVersion(row, expectedVersion);
    await deleteRow(this.manager, this.entity, this.keys(row));
    await this.record({ action: 'delete', rowId: row.id, before: row });
  }

  private keys(row: Row) {
    return { shopId: this.shopId, id: row.id };
  }

  private select(where: Where<Row>) {
    const builder = this.manager
      .createQueryBuilder(this.entity, 'row')
      .where('row.shopId = :shopId', { shopId: this.shopId });
    Object.entries(where).forEach(([key, value], index) => addCondition(builder, key, value, index));
    return builder;
  }

  private complete(values: NewRow<Row>): Row {
    const { now } = this.stamp;
    const editable = this.metadata.columns.some((column) => column.propertyName === 'version');
    const bookkeeping = editable ? { version: 1, updatedAt: now } : {};
    return Object.assign(new this.entity(), { createdAt: now }, bookkeeping, values, {
      shopId: this.shopId,
    }) as Row;
  }

  private requireVersion(row: Row, expected: number | undefined): void {
    if (expected !== undefined && this.isEditable(row) && row.version !== expected) throw staleVersion(row);
  }

  private isEditable(row: Row): row is Row & EditableRow {
    return typeof (row as { version?: unknown }).version === 'number';
  }

  private record(...changes: Change[]): Promise<void> {
    return recordChanges(this.manager, this.metadata, this.shopId, this.stamp, changes);
  }

  private get metadata() {
    return this.manager.connection.getMetadata(this.entity);
  }

  private missing(): never {
    throw notFound();
  }
}

/** Somebody changed the row since the version that was seen. */
export function staleVersion(row: object): ProblemError {
  const { version } = row as { version?: number };
  return new ProblemError(
    'stale-version',
    'Somebody changed this meanwhile. Load it again and repeat your change.',
    {
      facts: { version },
    },
  );
}

type Conditional = { andWhere(sql: string, parameters: Record<string, unknown>): unknown };

/** `null` asks for an empty column, a list for any of its values; `undefined` is a programming error, never "any". */
export function addCondition(builder: Conditional, key: string, value: unknown, index: number): void {
  if (value === undefined) throw new TypeError(`The condition on ${key} has no value.`);
  if (value === null) builder.andWhere(`row.${key} is null`, {});
  else if (!Array.isArray(value))
    builder.andWhere(`row.${key} = :where${index}`, { [`where${index}`]: value });
  else if (value.length === 0) builder.andWhere('1 = 0', {});
  else builder.andWhere(`row.${key} in (:...where${index})`, { [`where${index}`]: value });
}
