import pg from 'pg';
import { createDataSource } from './data-source.ts';

/** Any constant serves; it only has to be the same for every process that migrates this product. */
const MIGRATION_LOCK = 7_311_904;

/**
 * Brings a database to the newest schema. Concurrent starts wait for one another on an advisory lock, so each migration
 * runs once.
 */
export async function runMigrations(databaseUrl: string): Promise<void> {
  const guard = new pg.Client({ connectionString: databaseUrl });
  await guard.connect();
  try {
    await guard.query('SELECT pg_advisory_lock($1)', [MIGRATION_LOCK]);
    const db = createDataSource(databaseUrl, 2);
    await db.initialize();
    try {
      await db.runMigrations();
    } finally {
      await db.destroy();
    }
  } finally {
    await guard.end();
  }
}
