import { createHash } from 'node:crypto';
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inTurn } from './exclusive.mjs';
import { checkoutHash } from './folders.mjs';
import { Halt, say } from './halt.mjs';

const STAMP = 'node_modules/.ferrule-packages';

/**
 * Says which packages a tree holds: the lock, and the Node for which native parts were chosen.
 * @param {string} lock text of package-lock.json
 * @param {{ modules: string, platform: string, arch: string }} node
 */
export const packagesStamp = (lock, { modules, platform, arch }) =>
  `${createHash('sha256').update(lock).digest('hex')} ${modules} ${platform} ${arch}`;

/**
 * Whether npm's own record of what is installed agrees with the lock. npm writes it last, so a broken-off installation
 * has none. Optional packages may be missing: those are for other platforms.
 * @param {string} lock text of package-lock.json
 * @param {string} installed text of node_modules/.package-lock.json
 */
export function agrees(lock, installed) {
  const wanted = Object.entries(JSON.parse(lock).packages).filter(([path]) => path !== '');
  const found = JSON.parse(installed).packages;
  return wanted.every(([path, entry]) =>
    found[path] ? found[path].version === entry.version : Boolean(entry.optional || entry.devOptional),
  );
}

/** @param {string} path */
function readIfThere(path) {
  try {
    return readFileSync(path, 'utf8');
  } catch {
    return null;
  }
}

/**
 * Installs the packages of the lock when they are missing or belong to another lock.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} checkout
 */
export function ensurePackages(scope, checkout) {
  return inTurn(`packages/${checkoutHash(checkout)}`, async () => {
    const lock = readIfThere(join(checkout, 'package-lock.json'));
    if (lock === null) throw new Halt('package-lock.json is missing from the checkout. Restore it, then start again.');
    const stamp = packagesStamp(lock, {
      modules: process.versions.modules,
      platform: process.platform,
      arch: process.arch,
    });
    const kept = readIfThere(join(checkout, STAMP));
    if (kept === stamp) return;
    // A tree that `npm install` just brought up to the lock needs no second installation.
    const installed = readIfThere(join(checkout, 'node_modules/.package-lock.json'));
    if (installed === null || !agrees(lock, installed) || otherNode(kept, stamp)) {
      say('Installing packages from package-lock.json ...');
      const { command, args } = npmCommand(process.env);
      const code = await scope.run(command, [...args, 'ci', '--include=dev', '--no-audit', '--no-fund'], {
        cwd: checkout,
      });
      if (code !== 0)
        throw new Halt("The packages could not be installed: see npm's message above. Nothing else was changed.");
    }
    writeFileSync(join(checkout, STAMP), stamp);
  });
}

/**
 * @param {string | null} kept
 * @param {string} stamp
 */
const otherNode = (kept, stamp) =>
  kept !== null && kept.split(' ').slice(1).join(' ') !== stamp.split(' ').slice(1).join(' ');

/** @param {Record<string, string | undefined>} env */
function npmCommand(env) {
  const running = env['npm_execpath'];
  return running?.endsWith('.js') && running.includes('npm-cli')
    ? { command: process.execPath, args: [running] }
    : { command: 'npm', args: [] };
}
