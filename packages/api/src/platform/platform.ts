import type { Sequelize } from 'sequelize';
import type { DataSource } from 'typeorm';
import type { Config } from './config/config.js';
import { createDataSource, type EntityClass } from './database/data-source.js';
import { UnitOfWork } from './database/unit-of-work.js';
import { DiskFileStore, type FileStore } from './files/file-store.js';
import { RateLimits } from './http/rate-limits.js';
import { createLogger, type Logger } from './log/logger.js';
import { createPayments, type Payments } from './payments/payments-client.js';
import { createSessionDatabase, SessionStore } from './sessions/session-store.js';

/** What every slice stands on. */
export type Platform = {
  config: Config;
  log: Logger;
  clock: () => Date;
  dataSource: DataSource;
  sessionDatabase: Sequelize;
  work: UnitOfWork;
  sessions: SessionStore;
  limits: RateLimits;
  payments: Payments;
  files: FileStore;
  close(): Promise<void>;
};
export type PlatformOptions = { clock?: () => Date; limitScale?: number };

export async function openPlatform(
  config: Config,
  entities: readonly EntityClass[],
  { clock = () => new Date(), limitScale = 1 }: PlatformOptions = {},
): Promise<Platform> {
  const dataSource = createDataSource(config.database, entities);
  await dataSource.initialize();
  const sessionDatabase = createSessionDatabase(config.database);
  const sessions = new SessionStore(sessionDatabase, (sql, values) => dataSource.query(sql, values), clock);
  return {
    config,
    log: createLogger(config.logLevel),
    clock,
    dataSource,
    sessionDatabase,
    work: new UnitOfWork(dataSource),
    sessions,
    limits: new RateLimits(dataSource, config.database.name, limitScale),
    payments: createPayments(config.payments),
    files: new DiskFileStore(config.filesDir),
    async close() {
      sessions.stopExpiringSessions();
      await sessionDatabase.close();
      await dataSource.destroy();
    },
  };
}
