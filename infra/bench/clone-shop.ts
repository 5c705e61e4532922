import type { Connection, RowDataPacket } from 'mysql2/promise';

/** The tables of shops' rows with their columns, those that point at others after the others. */
export type TenantTable = { name: string; columns: string[] };

export async function tenantTables(sql: Connection): Promise<TenantTable[]> {
  const [rows] = await sql.query<RowDataPacket[]>(
    `select c.table_name name, group_concat(c.column_name order by c.ordinal_position) columns
     from information_schema.columns c join information_schema.tables t
       on t.table_schema = c.table_schema and t.table_name = c.table_name and t.table_type = 'BASE TABLE'
     where c.table_schema = database() and c.generation_expression is null
       and c.table_name in (select table_name from information_schema.key_column_usage
         where table_schema = database() and constraint_name = 'PRIMARY' and column_name = 'shop_id')
     group by c.table_name`,
  );
  return rows.map((row) => ({ name: String(row['name']), columns: String(row['columns']).split(',') }));
}

/**
 * Copies a shop with all its rows. Keys are (shop, id), so the ids stay and only the shop changes; what the payment
 * provider knows a shop by is left out, since it is unique.
 */
export async function cloneShop(
  sql: Connection,
  tables: readonly TenantTable[],
  from: string,
  to: string,
): Promise<void> {
  await copyShopRow(sql, from, to);
  for (const { name, columns } of tables) {
    const selected = columns.map((column) => valueOf(column));
    await sql.query(
      `insert into \`${name}\` (${columns.map((column) => `\`${column}\``).join(', ')})
       select ${selected.join(', ')} from \`${name}\` where shop_id = ?`,
      [to, from],
    );
  }
}

const UNIQUE_EVERYWHERE = new Set([
  'provider_customer_id',
  'provider_subscription_id',
  'payment_account_id',
  'token_hash',
]);
function valueOf(column: string): string {
  if (column === 'shop_id') return '?';
  return UNIQUE_EVERYWHERE.has(column)
    ? column === 'token_hash'
      ? 'sha2(uuid(), 256)'
      : 'null'
    : `\`${column}\``;
}

async function copyShopRow(sql: Connection, from: string, to: string): Promise<void> {
  const [rows] = await sql.query<RowDataPacket[]>('select * from shop where id = ?', [from]);
  const row = { ...rows[0], id: to, slug: `bench-${to}`, payment_account_id: null };
  await sql.query('insert into shop set ?', [row]);
}
