/**
 * Whether npm's own record of what is installed agrees with the lock. npm writes it last, so a broken-off installation
 * has none. Optional packages may be missing: those are for other platforms.
 * @param {string} lock text of package-lock.json
 * @param {string} installed text of node_modules/.package-lock.json
 */
export function agrees(lock: string, installed: string): boolean;
/**
 * Installs the packages of the lock when they are missing or belong to another lock.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} checkout
 */
export function ensurePackages(scope: import('./scope.mjs').Scope, checkout: string): Promise<void>;
export function packagesStamp(
  lock: string,
  {
    modules,
    platform,
    arch,
  }: {
    modules: string;
    platform: string;
    arch: string;
  },
): string;
