import type { DataSource } from 'typeorm';

/**
 * Gives the application's account what it needs on each table and no more: rows of append-only tables can be read and
 * inserted, the list of migrations only read, and nothing about the schema can be changed.
 */
export async function grantTables(
  dataSource: DataSource,
  user: string,
  host: string,
  appendOnly: readonly string[],
): Promise<void> {
  const account = `${quoted(user)}@${quoted(host)}`;
  const tables: { name: string }[] = await dataSource.query(
    `select table_name as name from information_schema.tables where table_schema = database() and table_type = 'BASE TABLE'`,
  );
  for (const { name } of tables)
    await dataSource.query(`grant ${rightsOn(name, appendOnly)} on \`${name}\` to ${account}`);
}

function rightsOn(table: string, appendOnly: readonly string[]): string {
  if (table === 'migration' || table === 'typeorm_metadata') return 'select';
  return appendOnly.includes(table) ? 'select, insert' : 'select, insert, update, delete';
}

function quoted(text: string): string {
  if (!/^[\w.%-]+$/.test(text))
    throw new TypeError('An account name has letters, digits, dots and dashes only.');
  return `'${text}'`;
}
