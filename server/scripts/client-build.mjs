import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inTurn } from './exclusive.mjs';
import { checkoutHash } from './folders.mjs';
import { Halt, say } from './halt.mjs';

/** All that the built client depends on. */
const SOURCES = ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'tsconfig.base.json', 'package-lock.json'];

/**
 * One hash over names and contents of the client's sources.
 * @param {string} checkout
 * @returns {string}
 */
export function clientSourcesHash(checkout) {
  const hash = createHash('sha256');
  const take = (/** @type {string} */ path) => {
    const whole = join(checkout, path);
    let entries;
    try {
      entries = readdirSync(whole);
    } catch (error) {
      if (error.code === 'ENOENT') return;
      if (error.code !== 'ENOTDIR') throw error;
      const content = readFileSync(whole);
      hash.update(`${path}\0${content.length}\0`).update(content);
      return;
    }
    for (const entry of entries.sort()) take(join(path, entry));
  };
  SOURCES.forEach(take);
  return hash.digest('hex');
}

/**
 * Builds the client when its sources changed since the last build. The new build takes the old one's place only when
 * it is whole.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} checkout
 * @returns {Promise<string>} folder to serve
 */
export function ensureClientBuild(scope, checkout) {
  const built = join(checkout, 'dist', 'web');
  const next = join(checkout, 'dist', 'web.next');
  const stampPath = join(checkout, 'dist', 'web.sources');
  return inTurn(`client/${checkoutHash(checkout)}`, async () => {
    const stamp = clientSourcesHash(checkout);
    const current =
      existsSync(join(built, 'index.html')) && existsSync(stampPath) && readFileSync(stampPath, 'utf8') === stamp;
    if (current) return built;
    say('Building the pages ...');
    const vite = join(checkout, 'node_modules', 'vite', 'bin', 'vite.js');
    const code = await scope.run(
      process.execPath,
      [vite, 'build', '--outDir', next, '--emptyOutDir', '--logLevel', 'warn'],
      {
        cwd: checkout,
        env: { ...process.env, NODE_ENV: 'production' },
      },
    );
    if (code !== 0)
      throw new Halt(
        'The pages could not be built: see the message above. An earlier build, if there was one, is untouched.',
      );
    rmSync(stampPath, { force: true });
    rmSync(built, { recursive: true, force: true });
    renameSync(next, built);
    writeFileSync(stampPath, stamp);
    return built;
  });
}
