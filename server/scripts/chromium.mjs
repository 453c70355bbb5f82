import { accessSync, constants } from 'node:fs';
import { join } from 'node:path';
import { installDebianPackage } from './debian-packages.mjs';
import { Halt } from './halt.mjs';

/**
 * @param {Record<string, string | undefined>} env
 * @returns {string | null} path of Debian's Chromium
 */
export function findChromium(env) {
  const folders = ['/usr/bin', ...(env['PATH'] ?? '').split(':').filter(Boolean)];
  return (
    folders
      .map((folder) => join(folder, 'chromium'))
      .find((path) => {
        try {
          accessSync(path, constants.X_OK);
          return true;
        } catch {
          return false;
        }
      }) ?? null
  );
}

/** @param {import('./scope.mjs').Scope} scope */
export async function ensureChromium(scope) {
  if (findChromium(process.env)) return;
  await installDebianPackage(scope, 'chromium', 'Chromium, for the browser tests,');
  if (!findChromium(process.env)) throw new Halt('Chromium was installed, but /usr/bin/chromium was not found.');
}
