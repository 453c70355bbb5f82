/**
 * Starts the application, noting who it is so that the next start finds it should this process be killed.
 * @param {import('./scope.mjs').Scope} scope
 * @param {{ checkout: string, folder: string, env: Record<string, string | undefined>, watch?: boolean }} options
 * @returns {import('node:child_process').ChildProcess}
 */
export function startServer(
  scope: import('./scope.mjs').Scope,
  {
    checkout,
    folder,
    env,
    watch,
  }: {
    checkout: string;
    folder: string;
    env: Record<string, string | undefined>;
    watch?: boolean;
  },
): import('node:child_process').ChildProcess;
/**
 * Ends an application that a killed run left behind.
 * @param {string} folder
 */
export function endEarlierServer(folder: string): Promise<void>;
/**
 * Waits until the application answers, first that it lives, then that it is ready.
 * @param {import('node:child_process').ChildProcess} child
 * @param {string} origin
 * @param {number} [limitMs]
 */
export function waitHealthy(
  child: import('node:child_process').ChildProcess,
  origin: string,
  limitMs?: number,
): Promise<void>;
/**
 * Waits until a child answers at an address with a success.
 * @param {import('node:child_process').ChildProcess} child
 * @param {string} url
 * @param {number} [limitMs]
 * @throws {Halt} when it ends first or takes too long
 */
export function waitForAnswer(
  child: import('node:child_process').ChildProcess,
  url: string,
  limitMs?: number,
): Promise<void>;
/** What Node needs to run the server's TypeScript. */
export const TSX: string[];
export function withTsx(env: Record<string, string | undefined>): {
  TSX_TSCONFIG_PATH: string;
};
