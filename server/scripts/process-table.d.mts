/**
 * When a process began, in clock ticks since boot; tells a process from a later one with the same id.
 * @param {number} pid
 * @returns {string | null} null when it is gone or only a zombie
 */
export function startTicks(pid: number): string | null;
/**
 * @param {string} folder
 * @returns {number[]} processes whose working folder it is; each process of a PostgreSQL server works in its data folder
 */
export function processesIn(folder: string): number[];
/**
 * @param {() => boolean} done
 * @param {number} limitMs
 * @returns {Promise<boolean>} whether it came true in time
 */
export function waitUntil(done: () => boolean, limitMs: number): Promise<boolean>;
/**
 * Ends a process that an earlier run left behind: asked first, killed after the grace.
 * @param {number} pid
 * @param {string} ticks from startTicks(), so that a stranger with the same id is let be
 * @param {number} graceMs
 */
export function endLeftBehind(pid: number, ticks: string, graceMs: number): Promise<void>;
