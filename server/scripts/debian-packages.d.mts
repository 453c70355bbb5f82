/**
 * Installs a Debian package, or says in one line what to run.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} name
 * @param {string} missing what is missing, as the beginning of a sentence
 */
export function installDebianPackage(scope: import('./scope.mjs').Scope, name: string, missing: string): Promise<void>;
export function rootPrefix({ uid, sudoWorks }: { uid: number; sudoWorks: () => boolean }): readonly string[] | null;
