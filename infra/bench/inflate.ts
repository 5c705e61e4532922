import type { Connection } from 'mysql2/promise';
import type { TenantTable } from './clone-shop.js';

/**
 * Multiplies the closed time entries and issued invoices of a shop until it has so many, by copies under new ids and
 * numbers, spread backwards in time. Enough for reading fast or slow; the copies' ledger entries are not made.
 */
export async function inflate(
  sql: Connection,
  tables: readonly TenantTable[],
  shopId: string,
  target: { timeEntries: number; invoices: number },
): Promise<void> {
  await multiply(
    sql,
    columnsOf(tables, 'time_entry'),
    'time_entry',
    shopId,
    target.timeEntries,
    'ended_at is not null',
    {
      id: 'uuid()',
      started_at: 'started_at - interval copy.n * 7 day',
      ended_at: 'ended_at - interval copy.n * 7 day',
    },
  );
  await multiply(
    sql,
    columnsOf(tables, 'invoice'),
    'invoice',
    shopId,
    target.invoices,
    'number is not null',
    {
      id: 'uuid()',
      number: 'number + copy.n * 100000',
      number_order: 'number_order + copy.n * 100000',
    },
  );
}

async function multiply(
  sql: Connection,
  columns: readonly string[],
  table: string,
  shopId: string,
  target: number,
  which: string,
  changed: Record<string, string>,
): Promise<void> {
  const [[row]] = (await sql.query(`select count(*) total from ${table} where shop_id = ? and ${which}`, [
    shopId,
  ])) as unknown as [{ total: number }[]];
  const copies = Math.ceil(target / Math.max(1, Number(row?.total))) - 1;
  if (copies < 1) return;
  await sql.query(
    `insert into ${table} (${columns.map((column) => `\`${column}\``).join(', ')})
     select ${columns.map((column) => changed[column] ?? `source.\`${column}\``).join(', ')}
     from ${table} source join (select seq n from seq_1_to_${copies}) copy
     where source.shop_id = ? and ${which}`,
    [shopId],
  );
}

function columnsOf(tables: readonly TenantTable[], name: string): readonly string[] {
  const table = tables.find((one) => one.name === name);
  if (!table) throw new Error(`There is no table ${name}.`);
  return table.columns;
}
