import { Halt } from './halt.mjs';

const MINUTE_MS = 60_000;

/**
 * @typedef {{ name: string, part: string, kind: 'check' | 'vitest' | 'playwright', args: readonly string[], limitMs: number, needsCluster?: true }} Stage
 *   name: what a person types; part: which of several checks of that name; args: for Node, from the root of the checkout
 */

/** @param {string} project */
const tsc = (project) =>
  /** @type {Stage} */ ({
    name: 'types',
    part: project,
    kind: 'check',
    args: ['node_modules/typescript/bin/tsc', '--noEmit', '-p', `${project}/tsconfig.json`],
    limitMs: 5 * MINUTE_MS,
  });

const vitest = ['node_modules/vitest/vitest.mjs', 'run', '--reporter=default', '--reporter=json'];

/** In the order in which they are told. @type {readonly Stage[]} */
export const STAGES = [
  {
    name: 'format',
    part: 'prettier',
    kind: 'check',
    args: ['node_modules/prettier/bin/prettier.cjs', '--check', '.'],
    limitMs: 4 * MINUTE_MS,
  },
  tsc('src'),
  tsc('server'),
  tsc('tests'),
  tsc('server/scripts'),
  {
    name: 'lint',
    part: 'eslint',
    kind: 'check',
    args: ['node_modules/eslint/bin/eslint.js', '.'],
    limitMs: 6 * MINUTE_MS,
  },
  {
    name: 'dependencies',
    part: 'dependency-cruiser',
    kind: 'check',
    args: [
      'node_modules/dependency-cruiser/bin/dependency-cruise.mjs',
      '--output-type',
      'json',
      'server',
      'shared',
      'src',
    ],
    limitMs: 4 * MINUTE_MS,
  },
  {
    name: 'unused',
    part: 'knip',
    kind: 'check',
    args: [
      'node_modules/knip/bin/knip.js',
      '--config',
      'server/scripts/knip.json',
      '--no-progress',
      '--no-config-hints',
    ],
    limitMs: 4 * MINUTE_MS,
  },
  {
    name: 'unit',
    part: 'unit and client',
    kind: 'vitest',
    args: [...vitest, '--project', 'unit', '--project', 'client'],
    limitMs: 8 * MINUTE_MS,
  },
  {
    name: 'api',
    part: 'api',
    kind: 'vitest',
    args: [...vitest, '--project', 'api'],
    limitMs: 10 * MINUTE_MS,
    needsCluster: true,
  },
  {
    name: 'e2e',
    part: 'browser',
    kind: 'playwright',
    args: ['node_modules/@playwright/test/cli.js', 'test', '--reporter=line,json'],
    limitMs: 15 * MINUTE_MS,
    needsCluster: true,
  },
];

/**
 * @param {readonly string[]} wanted names of stages; none means all
 * @returns {readonly Stage[]}
 * @throws {Halt} on a name that there is not
 */
export function selectStages(wanted) {
  const names = [...new Set(STAGES.map(({ name }) => name))];
  const unknown = wanted.filter((name) => !names.includes(name));
  if (unknown.length > 0)
    throw new Halt(`There is no stage "${unknown.join('", "')}". There are: ${names.join(', ')}.`);
  return wanted.length === 0 ? STAGES : STAGES.filter(({ name }) => wanted.includes(name));
}
