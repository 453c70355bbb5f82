import { spawnSync } from 'node:child_process';
import { Halt, say } from './halt.mjs';

/**
 * @param {{ uid: number, sudoWorks: () => boolean }} who
 * @returns {readonly string[] | null} what to put in front of a command that needs root; null when we may not
 */
export const rootPrefix = ({ uid, sudoWorks }) => (uid === 0 ? [] : sudoWorks() ? ['sudo', '-n'] : null);

const sudoWorks = () => spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0;

/**
 * Installs a Debian package, or says in one line what to run.
 * @param {import('./scope.mjs').Scope} scope
 * @param {string} name
 * @param {string} missing what is missing, as the beginning of a sentence
 */
export async function installDebianPackage(scope, name, missing) {
  const remedy = `Run: sudo apt-get install --no-install-recommends ${name}`;
  const prefix = rootPrefix({ uid: process.getuid?.() ?? 0, sudoWorks });
  if (!prefix) throw new Halt(`${missing} is not installed. ${remedy}`);
  say(`${missing} is not installed: installing Debian's ${name} ...`);
  const environment = ['env', 'DEBIAN_FRONTEND=noninteractive'];
  // What apt prints is of interest only when it fails, and goes to stderr then anyway.
  const apt = (/** @type {string[]} */ ...args) => {
    const [command, ...rest] = [...prefix, ...environment, 'apt-get', '-q', ...args];
    return scope.run(command ?? 'apt-get', rest, { stdio: ['ignore', 'ignore', 'inherit'] });
  };
  const updated = await apt('update');
  const installed = await apt('install', '-y', '--no-install-recommends', '--no-upgrade', name);
  if (updated !== 0 || installed !== 0) throw new Halt(`${missing} could not be installed. ${remedy}`);
}
