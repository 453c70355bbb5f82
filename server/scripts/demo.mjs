import { spawnSync } from 'node:child_process';
import { existsSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { CHECKOUT } from './folders.mjs';
import { Halt, say } from './halt.mjs';
import { TSX, withTsx } from './server-process.mjs';

/**
 * Whether the demo belongs in this database. Its sign-ins are public, so a server that somebody named gets it only when asked.
 * @param {{ wish: string | undefined, own: boolean }} asked wish: value of FERRULE_DEMO
 */
export const wantsDemo = ({ wish, own }) => (wish ? wish !== '0' : own);

/** @param {string} folder */
const markIn = (folder) => join(folder, 'demo-seeded');

/** @param {string} folder */
export const forgetDemo = (folder) => rmSync(markIn(folder), { force: true });

/**
 * Lays the demo out once.
 * @param {import('./scope.mjs').Scope} scope
 * @param {{ folder: string, own: boolean, env: Record<string, string | undefined> }} run env: the application's; own: the database is our own
 * @returns {Promise<string>} who may sign in; empty without a demo
 */
export async function seedDemo(scope, { folder, own, env }) {
  if (!wantsDemo({ wish: process.env['FERRULE_DEMO'], own })) return '';
  if (!own || !existsSync(markIn(folder))) {
    say('Laying out the demo ...');
    const code = await scope.run(process.execPath, [...TSX, 'server/db/seeds/seed-demo.ts'], {
      cwd: CHECKOUT,
      env: withTsx(env),
    });
    if (code !== 0)
      throw new Halt('The demo could not be laid out: see the message above. Set FERRULE_DEMO=0 to start without it.');
    if (own) writeFileSync(markIn(folder), new Date().toISOString());
  }
  return spawnSync(process.execPath, [...TSX, 'server/scripts/demo-sign-ins.ts'], {
    cwd: CHECKOUT,
    env: withTsx(process.env),
    encoding: 'utf8',
  }).stdout.trimEnd();
}
