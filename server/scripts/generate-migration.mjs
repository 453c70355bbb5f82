// npm run db:generate-migration -- name: writes what the entities have and the migrations so far do not.
import { createEmptyDatabase } from './databases.mjs';
import { CHECKOUT } from './folders.mjs';
import { Halt, say } from './halt.mjs';
import { ensurePackages } from './packages.mjs';
import { runCommand } from './scope.mjs';
import { TSX, withTsx } from './server-process.mjs';
import { throwAwayCluster } from './throw-away-cluster.mjs';

await runCommand(
  async (scope) => {
    const name = process.argv[2] ?? '';
    if (!/^[a-z][a-z0-9-]+$/.test(name))
      throw new Halt(
        'Name the migration in lower-case words joined by hyphens: npm run db:generate-migration -- add-a-thing',
      );
    await ensurePackages(scope, CHECKOUT);
    const url = await createEmptyDatabase(await throwAwayCluster(scope, 'migration'), 'ferrule_migration');
    const options = { cwd: CHECKOUT, env: withTsx({ ...process.env, DATABASE_URL: url }) };
    if ((await scope.run(process.execPath, [...TSX, 'server/scripts/migrate-command.ts'], options)) !== 0) return 1;
    const code = await scope.run(
      process.execPath,
      [
        ...TSX,
        'node_modules/typeorm/cli.js',
        'migration:generate',
        '-d',
        'server/db/cli-data-source.ts',
        `server/db/migrations/${name}`,
      ],
      options,
    );
    if (code === 0) say('Add the new class to server/db/migrations/all-migrations.ts.');
    return code;
  },
  { signalCode: 130 },
);
