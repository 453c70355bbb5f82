import { randomBytes } from 'node:crypto';
import { readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Halt } from './halt.mjs';

/** @typedef {{ sessionSecret: string, fieldKey: string, adminPassword: string, appPassword: string }} Secrets */

const NAMES = /** @type {const} */ (['sessionSecret', 'fieldKey', 'adminPassword', 'appPassword']);

/**
 * The secrets of one data folder: made at random the first time, then read again. Readable by their owner alone.
 * @param {string} folder
 * @returns {Secrets}
 */
export function loadSecrets(folder) {
  const path = join(folder, 'secrets.json');
  let text;
  try {
    text = readFileSync(path, 'utf8');
  } catch (error) {
    if (error.code !== 'ENOENT') throw new Halt(`The secrets in ${path} cannot be read (${error.code}).`);
    const made = Object.fromEntries(NAMES.map((name) => [name, randomBytes(32).toString('hex')]));
    // Written whole and then named, so that a crash leaves all of it or none.
    writeFileSync(`${path}.new`, JSON.stringify(made), { mode: 0o600 });
    renameSync(`${path}.new`, path);
    return /** @type {Secrets} */ (made);
  }
  const kept = parse(text);
  if (!kept)
    throw new Halt(`The secrets in ${path} are damaged. Nothing was changed. Put the file back from a backup.`);
  return kept;
}

/**
 * @param {string} text
 * @returns {Secrets | null}
 */
function parse(text) {
  try {
    const kept = JSON.parse(text);
    return NAMES.every((name) => typeof kept[name] === 'string' && /^[0-9a-f]{64}$/.test(kept[name])) ? kept : null;
  } catch {
    return null;
  }
}
