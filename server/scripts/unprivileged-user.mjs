import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { Halt } from './halt.mjs';

/** @typedef {{ name: string, uid: number, gid: number }} SystemUser */

/**
 * @param {string} passwd text of /etc/passwd
 * @returns {SystemUser | null} postgres if there is one, else nobody
 */
export function pickUser(passwd) {
  const users = passwd.split('\n').flatMap((line) => {
    const [name, , uid, gid] = line.split(':');
    return name && /^\d+$/.test(uid ?? '') && /^\d+$/.test(gid ?? '')
      ? [{ name, uid: Number(uid), gid: Number(gid) }]
      : [];
  });
  return (
    ['postgres', 'nobody'].map((name) => users.find((user) => user.name === name && user.uid !== 0)).find(Boolean) ??
    null
  );
}

/**
 * The user that the database runs as: null means "as we are". PostgreSQL refuses to run as root.
 * @returns {SystemUser | null}
 */
export function databaseUser() {
  if (process.getuid?.() !== 0) return null;
  const user = pickUser(readFileSync('/etc/passwd', 'utf8'));
  if (!user)
    throw new Halt(
      'PostgreSQL does not run as root, and /etc/passwd has neither a postgres nor a nobody user. Start Ferrule as an ordinary user.',
    );
  return user;
}

/**
 * @param {SystemUser | null} user
 * @param {string} folder
 * @returns {boolean} whether that user may pass through the folder
 */
export const canEnter = (user, folder) =>
  user === null || spawnSync('test', ['-x', folder], { uid: user.uid, gid: user.gid, cwd: '/' }).status === 0;
