import { spawnSync } from 'node:child_process';
import { accessSync, constants, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { installDebianPackage } from './debian-packages.mjs';
import { Halt } from './halt.mjs';

export const OLDEST_MAJOR = 15;
const DEBIAN_FOLDER = '/usr/lib/postgresql';

/** @typedef {{ folder: string, major: number }} PostgresServer */

/**
 * @param {string} line answer of `postgres --version`
 * @returns {number | null} major version
 */
export function majorOf(line) {
  const found = /\(PostgreSQL\) (\d+)/.exec(line);
  return found ? Number(found[1]) : null;
}

/**
 * The newest server serves, but data that is already there can only be read by its own major version.
 * @param {readonly PostgresServer[]} servers
 * @param {number | null} dataMajor
 * @returns {PostgresServer | null}
 */
export function chooseServer(servers, dataMajor) {
  const usable = servers.filter(({ major }) => (dataMajor === null ? major >= OLDEST_MAJOR : major === dataMajor));
  return usable.reduce(
    (best, next) => (best && best.major >= next.major ? best : next),
    /** @type {PostgresServer | null} */ (null),
  );
}

/**
 * @param {Record<string, string | undefined>} env POSTGRES_BIN names the only folder to look in; else Debian's folders and PATH
 * @returns {string[]}
 */
export function foldersToSearch(env) {
  if (env['POSTGRES_BIN']) return [env['POSTGRES_BIN']];
  let versions = /** @type {string[]} */ ([]);
  try {
    versions = readdirSync(DEBIAN_FOLDER);
  } catch {
    // No PostgreSQL of Debian's here.
  }
  return [
    ...versions.map((version) => join(DEBIAN_FOLDER, version, 'bin')),
    ...(env['PATH'] ?? '').split(':').filter(Boolean),
  ];
}

/**
 * @param {readonly string[]} folders
 * @returns {PostgresServer[]} those that hold a whole server
 */
export function findServers(folders) {
  return folders.flatMap((folder) => {
    try {
      for (const program of ['postgres', 'initdb']) accessSync(join(folder, program), constants.X_OK);
    } catch {
      return [];
    }
    const major = majorOf(
      spawnSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8', cwd: '/' }).stdout ?? '',
    );
    return major === null ? [] : [{ folder, major }];
  });
}

/**
 * Finds PostgreSQL's server, and installs Debian's when there is none and we may.
 * @param {import('./scope.mjs').Scope} scope
 * @param {number | null} dataMajor major version of data that is already there
 * @returns {Promise<PostgresServer>}
 */
export async function ensurePostgres(scope, dataMajor) {
  const look = () => chooseServer(findServers(foldersToSearch(process.env)), dataMajor);
  const present = look();
  if (present) return present;
  if (process.env['POSTGRES_BIN'])
    throw new Halt(
      `POSTGRES_BIN is ${process.env['POSTGRES_BIN']}, where no usable PostgreSQL server was found. Unset it, or point it at a folder with postgres and initdb of version ${dataMajor ?? `${OLDEST_MAJOR} or later`}.`,
    );
  await installDebianPackage(
    scope,
    dataMajor === null ? 'postgresql' : `postgresql-${dataMajor}`,
    `PostgreSQL's server${dataMajor === null ? '' : ` (version ${dataMajor}, which wrote the data)`}`,
  );
  const installed = look();
  if (!installed)
    throw new Halt(
      `Debian's postgresql was installed, but no server of version ${dataMajor ?? `${OLDEST_MAJOR} or later`} was found. Install one and start again.`,
    );
  return installed;
}
