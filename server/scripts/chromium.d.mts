/**
 * @param {Record<string, string | undefined>} env
 * @returns {string | null} path of Debian's Chromium
 */
export function findChromium(env: Record<string, string | undefined>): string | null;
/** @param {import('./scope.mjs').Scope} scope */
export function ensureChromium(scope: import('./scope.mjs').Scope): Promise<void>;
