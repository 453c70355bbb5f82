/**
 * A new cluster for one run, gone with the scope. Runs side by side get one each; what a killed run left is removed by
 * the next one.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} purpose
 * @param {readonly string[]} [settings]
 * @returns {Promise<string>} address of its administrator
 */
export function throwAwayCluster(
  scope: import('./scope.mjs').Scope,
  purpose: string,
  settings?: readonly string[],
): Promise<string>;
/**
 * The test cluster of this checkout, for test runners started by hand: started by the first that needs it, left running
 * for the next ones.
 * @param {import('./scope.mjs').Scope} scope
 * @returns {Promise<string>} address of its administrator
 */
export function sharedTestCluster(scope: import('./scope.mjs').Scope): Promise<string>;
/** Stops and removes the shared test cluster. */
export function removeSharedTestCluster(): Promise<void>;
