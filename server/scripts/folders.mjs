import { createHash } from 'node:crypto';
import { lstatSync, mkdirSync, realpathSync } from 'node:fs';
import { dirname, join, resolve, sep } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Halt } from './halt.mjs';

/** The checkout that these scripts belong to. */
export const CHECKOUT = realpathSync(fileURLToPath(new URL('../..', import.meta.url)));

/**
 * Names a checkout in twelve hexadecimal digits, so that two checkouts on one machine never share data.
 * @param {string} checkout
 */
export const checkoutHash = (checkout) => createHash('sha256').update(checkout).digest('hex').slice(0, 12);

/**
 * Where data that must last is kept: outside the checkout and outside the temporary folder.
 * @param {{ checkout: string, env: Record<string, string | undefined>, uid: number, home: string, temporary: string, flavour?: 'dev' }} place
 * @returns {string}
 * @throws {Halt} when FERRULE_DATA_DIR points into the checkout or the temporary folder
 */
export function dataFolder({ checkout, env, uid, home, temporary, flavour }) {
  const suffix = flavour ? `-${flavour}` : '';
  const hash = checkoutHash(checkout);
  const chosen = env['FERRULE_DATA_DIR'];
  const folder = chosen
    ? resolve(checkout, chosen) + suffix
    : uid === 0
      ? `/var/lib/ferrule-${hash}${suffix}`
      : join(env['XDG_STATE_HOME'] || join(home, '.local', 'state'), 'ferrule', `${hash}${suffix}`);
  if (isInside(checkout, folder))
    throw new Halt(`The data folder ${folder} lies inside the checkout. Set FERRULE_DATA_DIR to a folder outside it.`);
  if (!flavour && isInside(temporary, folder))
    throw new Halt(
      `The data folder ${folder} lies in the temporary folder, which is emptied. Set FERRULE_DATA_DIR to another one.`,
    );
  return folder;
}

/**
 * Where a throw-away cluster of this checkout lives.
 * @param {{ checkout: string, uid: number, base: string, name: string }} place
 */
export const throwAwayFolder = ({ checkout, uid, base, name }) =>
  join(base, `ferrule-${name}-${uid}-${checkoutHash(checkout)}`);

/**
 * @param {string} outer
 * @param {string} inner
 */
export const isInside = (outer, inner) =>
  inner === outer || inner.startsWith(outer.endsWith(sep) ? outer : outer + sep);

/**
 * Makes a folder that only its owner lists, and refuses one that belongs to somebody else or is a link: names in the
 * temporary folder can be foreseen by other users of the machine.
 * @param {string} folder
 * @param {number} uid
 */
export function prepareFolder(folder, uid) {
  mkdirSync(dirname(folder), { recursive: true });
  try {
    // The database runs as another user when we are root, and has to pass through.
    mkdirSync(folder, { mode: uid === 0 ? 0o711 : 0o700 });
  } catch (error) {
    if (error.code !== 'EEXIST')
      throw new Halt(
        `The folder ${folder} cannot be made (${error.code}). Set FERRULE_DATA_DIR to a folder you may write.`,
      );
  }
  const found = lstatSync(folder);
  if (!found.isDirectory() || found.uid !== uid)
    throw new Halt(`${folder} is not a folder of yours. Move it away, then start again.`);
}
