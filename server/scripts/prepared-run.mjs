import { mkdirSync } from 'node:fs';
import { homedir, tmpdir } from 'node:os';
import { join } from 'node:path';
import { dataMajor, startCluster } from './cluster.mjs';
import { ensureAppDatabase } from './databases.mjs';
import { forgetDemo } from './demo.mjs';
import { noteOf, takeExclusive } from './exclusive.mjs';
import { CHECKOUT, dataFolder, prepareFolder } from './folders.mjs';
import { Halt } from './halt.mjs';
import { ensurePackages } from './packages.mjs';
import { ensurePostgres } from './postgres-binaries.mjs';
import { loadSecrets } from './secrets.mjs';
import { endEarlierServer, TSX, withTsx } from './server-process.mjs';
import { databaseUser } from './unprivileged-user.mjs';

/**
 * What `npm start` and `npm run dev` share: the lock, packages, data folder, and database with its schema.
 * @param {import('./scope.mjs').Scope} scope
 * @param {{ flavour?: 'dev' }} [options]
 */
export async function prepareRun(scope, { flavour } = {}) {
  const uid = process.getuid?.() ?? 0;
  const folder = dataFolder({
    checkout: CHECKOUT,
    env: process.env,
    uid,
    home: homedir(),
    temporary: tmpdir(),
    ...(flavour ? { flavour } : {}),
  });
  const lock = await takeExclusive(`folder/${folder}`);
  if (!lock)
    throw new Halt(
      `Ferrule already runs on the data in ${folder}${await whereItRuns(folder)}. Nothing was changed. Stop that one first, or set FERRULE_DATA_DIR to another folder.`,
    );
  scope.add(() => lock.release());
  await ensurePackages(scope, CHECKOUT);
  prepareFolder(folder, uid);
  const secrets = loadSecrets(folder);
  for (const name of ['uploads', 'mail']) mkdirSync(join(folder, name), { recursive: true, mode: 0o700 });
  await endEarlierServer(folder);
  const database = await openDatabase(scope, folder, secrets);
  await migrate(scope, database.url);
  return { folder, secrets, lock, database };
}

/** @param {string} folder */
async function whereItRuns(folder) {
  const note = await noteOf(`folder/${folder}`);
  return note ? ` (${note})` : '';
}

/**
 * The database that DATABASE_URL names, or a cluster of our own.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} folder
 * @param {import('./secrets.mjs').Secrets} secrets
 */
async function openDatabase(scope, folder, secrets) {
  const given = process.env['DATABASE_URL'];
  if (given) return { url: given, own: false, ended: new Promise(() => undefined) };
  const server = await ensurePostgres(scope, dataMajor(folder));
  const cluster = await startCluster({
    folder,
    binaries: server.folder,
    user: databaseUser(),
    password: secrets.adminPassword,
  });
  scope.add(() => cluster.stop());
  // A new database has no demo yet, whatever an older one had.
  if (cluster.fresh) forgetDemo(folder);
  return {
    url: await ensureAppDatabase(cluster.adminUrl, secrets.appPassword),
    own: true,
    ended: new Promise((resolve) => cluster.child.once('exit', resolve)),
  };
}

/**
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} databaseUrl
 */
async function migrate(scope, databaseUrl) {
  const code = await scope.run(process.execPath, [...TSX, 'server/scripts/migrate-command.ts'], {
    cwd: CHECKOUT,
    env: withTsx({ ...process.env, DATABASE_URL: databaseUrl }),
  });
  if (code !== 0)
    throw new Halt(
      'The database could not be brought to the newest schema: see the message above. A migration that fails is rolled back as a whole.',
    );
}
