/**
 * Writes a migration by which the schema becomes what the entities say:
 *
 *   node infra/run/with-database.mjs -- node infra/database/draft-migration.mjs what-it-does [table …]
 *
 * Builds the API, migrates a scratch database with what is there, compares, and drops the scratch database again.
 * Naming tables leaves out the rest, for work in progress elsewhere in the tree.
 */
import { execFileSync } from 'node:child_process';
import { createConnection } from 'mysql2/promise';
import { rootFolder } from '../run/places.mjs';

const env = process.env;
const account = {
  host: env.BOOKMATCH_TEST_DB_HOST,
  port: Number(env.BOOKMATCH_TEST_DB_PORT),
  user: env.BOOKMATCH_TEST_DB_ROOT_USER,
  password: env.BOOKMATCH_TEST_DB_ROOT_PASSWORD,
};
const database = `draft_${process.pid}`;
const user = 'draft_application';
const root = await createConnection(account);
await root.query(`create database ${database} character set utf8mb4 collate utf8mb4_unicode_520_ci`);
await root.query(`create user if not exists '${user}'@'${account.host}'`);
try {
  run('npx', ['tsc', '-b', 'packages/api']);
  run('node', ['packages/api/dist/migrate.js']);
  run('node', ['packages/api/dist/migrate.js', '--draft', ...process.argv.slice(2)]);
} finally {
  await root.query(`drop database ${database}`);
  await root.end();
}

function run(command, words) {
  execFileSync(command, words, {
    cwd: rootFolder,
    stdio: 'inherit',
    env: {
      ...env,
      BOOKMATCH_DB_HOST: account.host,
      BOOKMATCH_DB_PORT: String(account.port),
      BOOKMATCH_DB_NAME: database,
      BOOKMATCH_DB_OWNER_USER: account.user,
      BOOKMATCH_DB_OWNER_PASSWORD: account.password,
      BOOKMATCH_DB_APPLICATION_USER: user,
    },
  });
}
