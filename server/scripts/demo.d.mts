/**
 * Lays the demo out once.
 * @param {import('./scope.mjs').Scope} scope
 * @param {{ folder: string, own: boolean, env: Record<string, string | undefined> }} run env: the application's; own: the database is our own
 * @returns {Promise<string>} who may sign in; empty without a demo
 */
export function seedDemo(
  scope: import('./scope.mjs').Scope,
  {
    folder,
    own,
    env,
  }: {
    folder: string;
    own: boolean;
    env: Record<string, string | undefined>;
  },
): Promise<string>;
export function wantsDemo({ wish, own }: { wish: string | undefined; own: boolean }): boolean;
export function forgetDemo(folder: string): void;
