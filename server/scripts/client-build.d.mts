/**
 * One hash over names and contents of the client's sources.
 * @param {string} checkout
 * @returns {string}
 */
export function clientSourcesHash(checkout: string): string;
/**
 * Builds the client when its sources changed since the last build. The new build takes the old one's place only when
 * it is whole.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} checkout
 * @returns {Promise<string>} folder to serve
 */
export function ensureClientBuild(scope: import('./scope.mjs').Scope, checkout: string): Promise<string>;
