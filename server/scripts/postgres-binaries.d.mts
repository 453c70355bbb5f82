/** @typedef {{ folder: string, major: number }} PostgresServer */
/**
 * @param {string} line answer of `postgres --version`
 * @returns {number | null} major version
 */
export function majorOf(line: string): number | null;
/**
 * The newest server serves, but data that is already there can only be read by its own major version.
 * @param {readonly PostgresServer[]} servers
 * @param {number | null} dataMajor
 * @returns {PostgresServer | null}
 */
export function chooseServer(servers: readonly PostgresServer[], dataMajor: number | null): PostgresServer | null;
/**
 * @param {Record<string, string | undefined>} env POSTGRES_BIN names the only folder to look in; else Debian's folders and PATH
 * @returns {string[]}
 */
export function foldersToSearch(env: Record<string, string | undefined>): string[];
/**
 * @param {readonly string[]} folders
 * @returns {PostgresServer[]} those that hold a whole server
 */
export function findServers(folders: readonly string[]): PostgresServer[];
/**
 * Finds PostgreSQL's server, and installs Debian's when there is none and we may.
 * @param {import('./scope.mjs').Scope} scope
 * @param {number | null} dataMajor major version of data that is already there
 * @returns {Promise<PostgresServer>}
 */
export function ensurePostgres(scope: import('./scope.mjs').Scope, dataMajor: number | null): Promise<PostgresServer>;
export const OLDEST_MAJOR: 15;
export type PostgresServer = {
  folder: string;
  major: number;
};
