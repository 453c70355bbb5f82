// npm run bench: measures on a throw-away cluster that writes as durably as a real one.
import { createEmptyDatabase } from './databases.mjs';
import { CHECKOUT } from './folders.mjs';
import { ensurePackages } from './packages.mjs';
import { runCommand } from './scope.mjs';
import { TSX, withTsx } from './server-process.mjs';
import { throwAwayCluster } from './throw-away-cluster.mjs';

const DURABLE = ['fsync=on', 'synchronous_commit=on', 'full_page_writes=on', 'max_connections=200'];

await runCommand(
  async (scope) => {
    await ensurePackages(scope, CHECKOUT);
    const adminUrl = await throwAwayCluster(scope, 'bench', DURABLE);
    const url = await createEmptyDatabase(adminUrl, 'ferrule_bench');
    return scope.run(process.execPath, [...TSX, 'tests/bench/run.ts', ...process.argv.slice(2)], {
      cwd: CHECKOUT,
      env: withTsx({ ...process.env, DATABASE_URL: url }),
    });
  },
  { signalCode: 130 },
);
