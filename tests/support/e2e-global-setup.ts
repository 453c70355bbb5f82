import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureClientBuild } from '../../server/scripts/client-build.mjs';
import { CHECKOUT } from '../../server/scripts/folders.mjs';
import { appEnvironment, localOrigin } from '../../server/scripts/given-environment.mjs';
import { quietPort } from '../../server/scripts/ports.mjs';
import { Scope } from '../../server/scripts/scope.mjs';
import { loadSecrets } from '../../server/scripts/secrets.mjs';
import { startServer, TSX, waitHealthy, withTsx } from '../../server/scripts/server-process.mjs';
import { sharedTestCluster } from '../../server/scripts/throw-away-cluster.mjs';
import { createTestDatabase, dropAbandonedDatabases, dropTestDatabase } from './test-database.ts';

/** The whole product on a fresh database with the demo in it, at FERRULE_E2E_ORIGIN; gone when the tests are over. */
export default async function setup(): Promise<() => Promise<void>> {
  const scope = new Scope();
  try {
    const webDir = await ensureClientBuild(scope, CHECKOUT);
    const adminUrl = process.env['FERRULE_TEST_ADMIN_URL'] ?? (await sharedTestCluster(scope));
    await dropAbandonedDatabases(adminUrl);
    const databaseUrl = await createTestDatabase(adminUrl, { template: 'template0', purpose: 'browser' });
    scope.add(() => dropTestDatabase(adminUrl, databaseUrl));
    const folder = await mkdtemp(join(tmpdir(), 'ferrule-browser-'));
    scope.add(() => rm(folder, { recursive: true, force: true }));
    const port = await quietPort();
    const origin = localOrigin(undefined, port);
    const env = {
      NODE_ENV: 'test',
      RELAXED_LIMITS: '1',
      WEB_DIR: webDir,
      ...appEnvironment({ env: process.env, folder, secrets: loadSecrets(folder), databaseUrl, port, origin }),
      // Addresses that the person's shell may hold are not meant for this application.
      PUBLIC_ORIGIN: origin,
      HOST: '127.0.0.1',
    };
    for (const step of ['server/scripts/migrate-command.ts', 'server/db/seeds/seed-demo.ts']) {
      if ((await scope.run(process.execPath, [...TSX, step], { cwd: CHECKOUT, env: withTsx(env) })) !== 0)
        throw new Error(`${step} failed: see its message above`);
    }
    const server = startServer(scope, { checkout: CHECKOUT, folder, env });
    await waitHealthy(server, origin);
    process.env['FERRULE_E2E_ORIGIN'] = origin;
    process.env['FERRULE_E2E_MAIL_DIR'] = join(folder, 'mail');
    return () => scope.close();
  } catch (error) {
    await scope.close();
    throw error;
  }
}
