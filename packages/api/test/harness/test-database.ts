import { randomBytes } from 'node:crypto';
import { createConnection, type Connection } from 'mysql2/promise';
import { APPEND_ONLY_TABLES, ENTITIES } from '../../src/entities.js';
import { MIGRATIONS } from '../../src/migrations/all-migrations.js';
import type { DatabaseConfig } from '../../src/platform/config/config.js';
import { createDataSource } from '../../src/platform/database/data-source.js';
import { grantTables } from '../../src/platform/database/grants.js';

export type TestDatabase = {
  /** The application's own account, with no more rights than it has in production. */
  application: DatabaseConfig;
  owner: DatabaseConfig;
  drop(): Promise<void>;
};

/** A database of its own for a test file, migrated, with an application account that may do no more than in production. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const root = await createConnection(rootAccount());
  const name = `test_${process.pid}_${randomBytes(5).toString('hex')}`;
  const password = randomBytes(12).toString('hex');
  await root.query(`create database ${name} character set utf8mb4 collate utf8mb4_unicode_520_ci`);
  await root.query(`create user '${name}'@'${rootAccount().host}' identified by '${password}'`);
  const owner: DatabaseConfig = { ...rootAccount(), name, pool: 4 };
  await migrate(owner, name);
  return {
    owner,
    application: { ...owner, user: name, password, pool: 24 },
    drop: () => drop(root, name),
  };
}

async function migrate(owner: DatabaseConfig, applicationUser: string): Promise<void> {
  const dataSource = await createDataSource(owner, ENTITIES, MIGRATIONS).initialize();
  await dataSource.runMigrations({ transaction: 'none' });
  await grantTables(dataSource, applicationUser, owner.host, APPEND_ONLY_TABLES);
  await dataSource.destroy();
}

async function drop(root: Connection, name: string): Promise<void> {
  await root.query(`drop database if exists ${name}`);
  await root.query(`drop user if exists '${name}'@'${rootAccount().host}'`);
  await root.end();
}

function rootAccount() {
  const env = (key: string) => {
    const value = process.env[`BOOKMATCH_TEST_DB_${key}`];
    if (!value) throw new Error('Run through: node infra/run/with-database.mjs -- npx jest …');
    return value;
  };
  return {
    host: env('HOST'),
    port: Number(env('PORT')),
    user: env('ROOT_USER'),
    password: env('ROOT_PASSWORD'),
  };
}
