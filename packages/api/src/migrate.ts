import { writeFileSync } from 'node:fs';
import { APPEND_ONLY_TABLES, ENTITIES } from './entities.js';
import { MIGRATIONS } from './migrations/all-migrations.js';
import type { DatabaseConfig } from './platform/config/config.js';
import { createDataSource } from './platform/database/data-source.js';
import { draftMigration } from './platform/database/draft-migration.js';
import { grantTables } from './platform/database/grants.js';

/**
 * Brings the schema up to date with the owner's account, then grants the application's account its share, table by
 * table. `--down` takes the newest migration back; `--draft what-it-does
 * [tables]` writes a migration by which the schema becomes what the entities say.
 */
const env = process.env;
const required = (name: string): string => {
  const value = env[name];
  if (value === undefined || value === '') throw new Error(`${name} is not set.`);
  return value;
};
const database: DatabaseConfig = {
  host: env['BOOKMATCH_DB_HOST'] ?? '127.0.0.1',
  port: Number(env['BOOKMATCH_DB_PORT'] ?? 3306),
  name: required('BOOKMATCH_DB_NAME'),
  user: required('BOOKMATCH_DB_OWNER_USER'),
  password: required('BOOKMATCH_DB_OWNER_PASSWORD'),
  pool: 2,
};

const dataSource = await createDataSource(database, ENTITIES, MIGRATIONS).initialize();
try {
  if (process.argv.includes('--draft')) {
    const [what = 'changes', ...tables] = process.argv.slice(process.argv.indexOf('--draft') + 1);
    const { file, text } = await draftMigration(dataSource, what, tables, new Date());
    writeFileSync(new URL(`../src/migrations/${file}`, import.meta.url), text);
    console.log(`Wrote ${file}. Add it to all-migrations.ts.`);
  } else if (process.argv.includes('--down')) {
    await dataSource.undoLastMigration({ transaction: 'none' });
  } else {
    const done = await dataSource.runMigrations({ transaction: 'none' });
    await grantTables(
      dataSource,
      required('BOOKMATCH_DB_APPLICATION_USER'),
      database.host,
      APPEND_ONLY_TABLES,
    );
    console.log(
      done.length === 0 ? 'The schema is up to date.' : `Applied ${done.map(({ name }) => name).join(', ')}.`,
    );
  }
} finally {
  await dataSource.destroy();
}
