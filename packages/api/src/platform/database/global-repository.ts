import type { EntityManager } from 'typeorm';
import { notFound } from '../http/problem-error.js';
import { difference, recordChanges, type Change } from './audit.js';
import type { GlobalRow } from './rows.js';
import type { Stamp } from './stamp.js';
import { addCondition } from './shop-repository.js';
import { deleteRow, insertRows, updateRow } from './statements.js';

type Plain = Record<string, unknown>;
type Where<Row> = { [Key in keyof Row]?: Row[Key] | readonly Row[Key][] | null };

/** Reads and writes rows that belong to no shop. */
export class GlobalRepository<Row extends GlobalRow> {
  constructor(
    private readonly manager: EntityManager,
    private readonly entity: new () => Row,
    private readonly stamp: Stamp,
    /** The shop whose audit trail a change belongs in, when one is acting. */
    private readonly auditShopId: string | null = null,
  ) {}

  findBy(where: Where<Row>, orderBy?: keyof Row & string, lock = false): Promise<Row[]> {
    const builder = this.manager.createQueryBuilder(this.entity, 'row').where('1 = 1');
    Object.entries(where).forEach(([key, value], index) => addCondition(builder, key, value, index));
    if (orderBy) builder.orderBy(`row.${orderBy}`);
    if (lock) builder.setLock('pessimistic_write');
    return builder.getMany();
  }

  async findOneBy(where: Where<Row>, lock = false): Promise<Row | null> {
    return (await this.findBy(where, undefined, lock))[0] ?? null;
  }

  async get(id: string, lock = false): Promise<Row> {
    const row = await this.findOneBy({ id } as Where<Row>, lock);
    if (!row) throw notFound();
    return row;
  }

  async insert(values: Omit<Row, 'createdAt'>): Promise<Row> {
    const row = Object.assign(new this.entity(), { createdAt: this.stamp.now }, values) as Row;
    await insertRows(this.manager, this.entity, [row]);
    await this.record({ action: 'insert', rowId: row.id, after: row });
    return row;
  }

  async update(row: Row, patch: Partial<Omit<Row, 'id' | 'createdAt'>>): Promise<Row> {
    const { before, after } = difference(row as unknown as Plain, patch as Plain);
    if (Object.keys(after).length === 0) return row;
    await updateRow(this.manager, this.entity, { id: row.id }, after);
    await this.record({ action: 'update', rowId: row.id, before, after });
    return Object.assign(Object.create(Object.getPrototypeOf(row) as object) as Row, row, after);
  }

  async delete(row: Row): Promise<void> {
    await deleteRow(this.manager, this.entity, { id: row.id });
    await this.record({ action: 'delete', rowId: row.id, before: row });
  }

  private record(change: Change): Promise<void> {
    return recordChanges(
      this.manager,
      this.manager.connection.getMetadata(this.entity),
      this.auditShopId,
      this.stamp,
      [change],
    );
  }
}
