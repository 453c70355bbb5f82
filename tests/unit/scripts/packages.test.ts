import { describe, expect, it } from 'vitest';
import { agrees, packagesStamp } from '../../../server/scripts/packages.mjs';

const node = { modules: '115', platform: 'linux', arch: 'x64' };
const lock = (packages: Record<string, object>): string => JSON.stringify({ packages });

describe('stamp of the installed packages', () => {
  it('changes with the lock and with the Node that native parts were chosen for', () => {
    const stamp = packagesStamp('lock', node);
    expect(packagesStamp('lock', { ...node })).toBe(stamp);
    expect(packagesStamp('lock ', node)).not.toBe(stamp);
    expect(packagesStamp('lock', { ...node, modules: '127' })).not.toBe(stamp);
    expect(packagesStamp('lock', { ...node, arch: 'arm64' })).not.toBe(stamp);
  });
});

describe("npm's record of what is installed", () => {
  const wanted = lock({
    '': {},
    'node_modules/a': { version: '1.0.0' },
    'node_modules/b': { version: '2.0.0', optional: true },
  });

  it.each([
    ['all there', { 'node_modules/a': { version: '1.0.0' }, 'node_modules/b': { version: '2.0.0' } }, true],
    ['an optional one for another platform left out', { 'node_modules/a': { version: '1.0.0' } }, true],
    ['another version', { 'node_modules/a': { version: '1.0.1' } }, false],
    [
      'another version of an optional one',
      { 'node_modules/a': { version: '1.0.0' }, 'node_modules/b': { version: '1.0.0' } },
      false,
    ],
    ['one missing', { 'node_modules/b': { version: '2.0.0' } }, false],
  ])('%s', (_case, installed, expected) => {
    expect(agrees(wanted, lock(installed))).toBe(expected);
  });
});
