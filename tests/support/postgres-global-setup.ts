import type { TestProject } from 'vitest/node';
import { runMigrations } from '../../server/db/migrate.ts';
import { Scope } from '../../server/scripts/scope.mjs';
import { sharedTestCluster } from '../../server/scripts/throw-away-cluster.mjs';
import { dropAbandonedDatabases, ensureMigratedTemplate } from './test-database.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Administrator's address of the throw-away cluster. */
    adminUrl: string;
  }
}

/** The cluster that `npm test` started, or the shared one of this checkout, with the migrated template in it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const adminUrl = process.env['FERRULE_TEST_ADMIN_URL'] ?? (await sharedTestCluster(new Scope()));
  await dropAbandonedDatabases(adminUrl);
  await ensureMigratedTemplate(adminUrl, runMigrations);
  project.provide('adminUrl', adminUrl);
  return () => dropAbandonedDatabases(adminUrl);
}
