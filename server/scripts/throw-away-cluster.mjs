import { rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { clearLeftovers, livingPostmaster } from './cluster-leftovers.mjs';
import { adminUrlOf, dataFolderOf, dataMajor, startCluster, THROW_AWAY_SETTINGS } from './cluster.mjs';
import { markThrowAway } from './databases.mjs';
import { inTurn, takeExclusive } from './exclusive.mjs';
import { CHECKOUT, prepareFolder, throwAwayFolder } from './folders.mjs';
import { Halt } from './halt.mjs';
import { ensurePostgres } from './postgres-binaries.mjs';
import { loadSecrets } from './secrets.mjs';
import { canEnter, databaseUser } from './unprivileged-user.mjs';

const uid = process.getuid?.() ?? 0;

/** @param {string} name */
function folderNamed(name) {
  const user = databaseUser();
  const base = [tmpdir(), '/var/tmp', '/tmp'].find((folder) => canEnter(user, folder)) ?? '/tmp';
  return throwAwayFolder({ checkout: CHECKOUT, uid, base, name });
}

/**
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} folder
 * @param {{ settings: readonly string[], outlives: boolean }} options
 */
async function start(scope, folder, options) {
  prepareFolder(folder, uid);
  const server = await ensurePostgres(scope, dataMajor(folder));
  const cluster = await startCluster({
    folder,
    binaries: server.folder,
    user: databaseUser(),
    password: loadSecrets(folder).adminPassword,
    ...options,
  });
  await markThrowAway(cluster.adminUrl);
  return cluster;
}

/** @param {string} folder */
async function remove(folder) {
  await clearLeftovers(dataFolderOf(folder));
  rmSync(folder, { recursive: true, force: true });
}

/**
 * A new cluster for one run, gone with the scope. Runs side by side get one each; what a killed run left is removed by
 * the next one.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} purpose
 * @param {readonly string[]} [settings]
 * @returns {Promise<string>} address of its administrator
 */
export async function throwAwayCluster(scope, purpose, settings = THROW_AWAY_SETTINGS) {
  for (let slot = 1; slot <= 8; slot += 1) {
    const folder = folderNamed(`${purpose}-${slot}`);
    const lock = await takeExclusive(`folder/${folder}`);
    if (!lock) continue;
    await remove(folder);
    scope.add(() => remove(folder));
    const cluster = await start(scope, folder, { settings, outlives: false });
    scope.add(() => cluster.stop());
    return cluster.adminUrl;
  }
  throw new Halt('Eight such runs of this checkout are under way. Wait for one to end.');
}

const SHARED = 'shared-test';

/**
 * The test cluster of this checkout, for test runners started by hand: started by the first that needs it, left running
 * for the next ones.
 * @param {import('./scope.mjs').Scope} scope
 * @returns {Promise<string>} address of its administrator
 */
export function sharedTestCluster(scope) {
  const folder = folderNamed(SHARED);
  return inTurn(`folder/${folder}`, async () => {
    const living = livingPostmaster(dataFolderOf(folder));
    if (living?.ready) return adminUrlOf(living.port, loadSecrets(folder).adminPassword);
    return (await start(scope, folder, { settings: THROW_AWAY_SETTINGS, outlives: true })).adminUrl;
  });
}

/** Stops and removes the shared test cluster. */
export function removeSharedTestCluster() {
  const folder = folderNamed(SHARED);
  return inTurn(`folder/${folder}`, () => remove(folder));
}
