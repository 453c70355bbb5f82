/**
 * What PostgreSQL wrote about the server of a data folder.
 * @param {string} text of postmaster.pid
 * @returns {{ pid: number, port: number, ready: boolean }}
 */
export function parsePostmaster(text: string): {
  pid: number;
  port: number;
  ready: boolean;
};
/**
 * @param {string} dataFolder
 * @returns {ReturnType<typeof parsePostmaster> | null} null when there is no such file
 */
export function readPostmaster(dataFolder: string): ReturnType<typeof parsePostmaster> | null;
/**
 * @param {string} dataFolder
 * @returns {ReturnType<typeof parsePostmaster> | null} the server that runs on that folder now
 */
export function livingPostmaster(dataFolder: string): ReturnType<typeof parsePostmaster> | null;
/**
 * Ends a server that an earlier run left behind, waits for orphaned backends, and removes a postmaster.pid whose number
 * belongs to a stranger or to a dead process that nobody has reaped: PostgreSQL takes both for a running server.
 * @param {string} dataFolder
 * @throws {Halt} when something still works on the data: starting then would damage it
 */
export function clearLeftovers(dataFolder: string): Promise<void>;
