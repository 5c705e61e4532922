import { randomBytes } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection, type Connection } from 'mysql2/promise';
import { APPEND_ONLY_TABLES, ENTITIES } from '@bookmatch/api/entities';
import { MIGRATIONS } from '@bookmatch/api/migrations/all-migrations';
import { readConfig } from '@bookmatch/api/platform/config/config';
import { createDataSource } from '@bookmatch/api/platform/database/data-source';
import { grantTables } from '@bookmatch/api/platform/database/grants';
import { openPlatform, type Platform } from '@bookmatch/api/platform/platform';
import { startPaymentsFake, type PaymentsFake } from '../../fakes/payments/start.js';

/** What the demo is made on, as `npm start` has it: a migrated database of its own and the payment stand-in. */
export type DemoGround = {
  platform: Platform;
  root: Connection;
  databaseName: string;
  close(): Promise<void>;
};

export async function openDemoGround(): Promise<DemoGround> {
  const server = serverOf(process.env);
  const root = await createConnection(server);
  const name = `test_demo_${process.pid}_${randomBytes(4).toString('hex')}`;
  const password = randomBytes(12).toString('hex');
  await root.query(`create database ${name} character set utf8mb4 collate utf8mb4_unicode_520_ci`);
  await root.query(`create user '${name}'@'${server.host}' identified by '${password}'`);
  await migrate({ ...server, name }, name);
  const payments = await startPaymentsFake();
  const files = await mkdtemp(join(tmpdir(), 'demo-files-'));
  const platform = await openPlatform(
    readConfig(environment({ server, name, password, payments, files })),
    ENTITIES,
  );
  return {
    platform,
    root,
    databaseName: name,
    async close() {
      await platform.close();
      await payments.close();
      await root.query(`drop database ${name}`);
      await root.query(`drop user '${name}'@'${server.host}'`);
      await root.end();
      await rm(files, { recursive: true, force: true });
    },
  };
}

type Server = { host: string; port: number; user: string; password: string };

function serverOf(env: NodeJS.ProcessEnv): Server {
  const read = (key: string) => {
    const value = env[`BOOKMATCH_TEST_DB_${key}`];
    if (!value) throw new Error('Run through: node infra/run/with-database.mjs -- npx jest …');
    return value;
  };
  return {
    ...{ host: read('HOST'), port: Number(read('PORT')) },
    ...{ user: read('ROOT_USER'), password: read('ROOT_PASSWORD') },
  };
}

async function migrate(owner: Server & { name: string }, applicationUser: string): Promise<void> {
  const dataSource = await createDataSource({ ...owner, pool: 2 }, ENTITIES, MIGRATIONS).initialize();
  await dataSource.runMigrations({ transaction: 'none' });
  await grantTables(dataSource, applicationUser, owner.host, APPEND_ONLY_TABLES);
  await dataSource.destroy();
}

type Places = { server: Server; name: string; password: string; payments: PaymentsFake; files: string };

function environment({ server, name, password, payments, files }: Places): NodeJS.ProcessEnv {
  return {
    ...{ BOOKMATCH_MODE: 'test', BOOKMATCH_LOG_LEVEL: 'fatal' },
    ...{ BOOKMATCH_ORIGIN: 'http://localhost:4310', BOOKMATCH_SECRET: randomBytes(32).toString('hex') },
    ...{ BOOKMATCH_DB_HOST: server.host, BOOKMATCH_DB_PORT: String(server.port) },
    ...{ BOOKMATCH_DB_NAME: name, BOOKMATCH_DB_USER: name, BOOKMATCH_DB_PASSWORD: password },
    BOOKMATCH_FILES_DIR: files,
    ...{ BOOKMATCH_MAIL_HOST: '127.0.0.1', BOOKMATCH_MAIL_PORT: '2525', BOOKMATCH_MAIL_TLS: 'off' },
    BOOKMATCH_MAIL_FROM: 'post@bookmatch.test',
    ...{
      BOOKMATCH_PAYMENTS_KEY: 'sk_test_bookmatch',
      BOOKMATCH_PAYMENTS_WEBHOOK_SECRET: 'whsec_of_the_demo',
    },
    BOOKMATCH_PAYMENTS_PRICE: 'price_bookmatch_member_month',
    BOOKMATCH_PAYMENTS_API: payments.url,
  };
}
