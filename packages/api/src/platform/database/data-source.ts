import 'reflect-metadata';
import { DataSource, type ObjectLiteral } from 'typeorm';
import type { DatabaseConfig } from '../config/config.js';
import type { MigrationClass } from './migration-class.js';
import { SnakeNaming } from './naming.js';

export type EntityClass = new () => ObjectLiteral;

export function createDataSource(
  database: DatabaseConfig,
  entities: readonly EntityClass[],
  migrations: readonly MigrationClass[] = [],
): DataSource {
  return new DataSource({
    type: 'mariadb',
    host: database.host,
    port: database.port,
    username: database.user,
    password: database.password,
    database: database.name,
    charset: 'utf8mb4',
    timezone: 'Z',
    dateStrings: ['DATE'],
    supportBigNumbers: true,
    bigNumberStrings: false,
    entities: [...entities],
    migrations: [...migrations],
    migrationsTableName: 'migration',
    migrationsTransactionMode: 'none',
    namingStrategy: new SnakeNaming(),
    synchronize: false,
    logging: false,
    poolSize: database.pool,
    extra: {
      connectionLimit: database.pool,
      maxIdle: database.pool,
      idleTimeout: 60_000,
      enableKeepAlive: true,
    },
  });
}
