import 'reflect-metadata';
import type { Pool } from 'pg';
import { DataSource, type DataSourceOptions } from 'typeorm';
import { ALL_ENTITIES } from '../entities/all-entities.ts';
import { ALL_MIGRATIONS } from './migrations/all-migrations.ts';
import { SnakeNaming } from './snake-naming.ts';

export const dataSourceOptions = (url: string, poolSize: number): DataSourceOptions => ({
  type: 'postgres',
  url,
  entities: ALL_ENTITIES,
  migrations: ALL_MIGRATIONS,
  migrationsTransactionMode: 'all',
  namingStrategy: new SnakeNaming(),
  synchronize: false,
  // The built-in gen_random_uuid() serves; no extension is made on connect.
  installExtensions: false,
  uuidExtension: 'pgcrypto',
  poolSize,
  applicationName: 'ferrule',
  // A day that the database works out is a day in UTC, wherever its server stands.
  extra: { connectionTimeoutMillis: 10_000, options: '-c timezone=UTC' },
});

export const createDataSource = (url: string, poolSize = 10): DataSource =>
  new DataSource(dataSourceOptions(url, poolSize));

/** The pool under TypeORM, for named statements on hot paths and for libraries that speak pg. */
export const poolOf = (db: DataSource): Pool => (db.driver as unknown as { master: Pool }).master;
