/**
 * @param {string} folder of the cluster
 * @returns {number | null} major version of the data that is there
 */
export function dataMajor(folder: string): number | null;
/**
 * Starts the cluster of a folder on a free loopback port, making it the first time. The caller holds the folder's lock.
 * @param {{ folder: string, binaries: string, user: SystemUser | null, password: string, settings?: readonly string[], outlives?: boolean }} options
 *   outlives: the server stays when this process ends
 * @returns {Promise<Cluster & { fresh: boolean }>}
 */
export function startCluster({
  folder,
  binaries,
  user,
  password,
  settings,
  outlives,
}: {
  folder: string;
  binaries: string;
  user: SystemUser | null;
  password: string;
  settings?: readonly string[];
  outlives?: boolean;
}): Promise<
  Cluster & {
    fresh: boolean;
  }
>;
export const ADMIN_ROLE: 'ferrule_admin';
/** Losing the newest transactions at a power cut is fine for data that is thrown away. */
export const THROW_AWAY_SETTINGS: string[];
export function dataFolderOf(folder: string): string;
export function adminUrlOf(port: number, password: string): string;
export type SystemUser = import('./unprivileged-user.mjs').SystemUser;
export type Cluster = {
  adminUrl: string;
  port: number;
  child: import('node:child_process').ChildProcess;
  stop(): Promise<void>;
};
