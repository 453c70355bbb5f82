import { runMigrations } from '../db/migrate.ts';

/** Brings the database of DATABASE_URL to the newest schema; what `npm start`, the browser tests and the migration tool run. */
await runMigrations(process.env['DATABASE_URL'] ?? '');
