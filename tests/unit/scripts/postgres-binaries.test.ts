import { chmod, mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { rootPrefix } from '../../../server/scripts/debian-packages.mjs';
import { chooseServer, findServers, foldersToSearch, majorOf } from '../../../server/scripts/postgres-binaries.mjs';

const servers = [14, 15, 17, 16].map((major) => ({ folder: `/pg/${major}`, major }));

describe('choice of the PostgreSQL server', () => {
  it('reads the major version', () => {
    expect(majorOf('postgres (PostgreSQL) 15.18 (Debian 15.18-0+deb12u1)')).toBe(15);
    expect(majorOf('postgres (PostgreSQL) 18beta1')).toBe(18);
    expect(majorOf('')).toBeNull();
  });

  it('takes the newest for new data and the same version for data that is there', () => {
    expect(chooseServer(servers, null)?.major).toBe(17);
    expect(chooseServer(servers, 16)?.major).toBe(16);
    expect(chooseServer(servers, 18)).toBeNull();
    expect(chooseServer(servers.slice(0, 1), null)).toBeNull();
    expect(chooseServer([], null)).toBeNull();
  });

  it('looks in one named folder only, else on PATH too', () => {
    expect(foldersToSearch({ POSTGRES_BIN: '/opt/pg/bin', PATH: '/usr/bin' })).toEqual(['/opt/pg/bin']);
    expect(foldersToSearch({ PATH: '/a:/b' }).slice(-2)).toEqual(['/a', '/b']);
  });
});

describe('folders on the disk', () => {
  let root = '';
  beforeAll(async () => {
    root = await mkdtemp(join(tmpdir(), 'ferrule-binaries-'));
    for (const [folder, programs] of [
      ['whole', ['postgres', 'initdb']],
      ['client', ['psql']],
      ['half', ['postgres']],
    ] as const) {
      await mkdir(join(root, folder));
      for (const program of programs) {
        await writeFile(join(root, folder, program), '#!/bin/sh\necho "postgres (PostgreSQL) 16.2"\n');
        await chmod(join(root, folder, program), 0o755);
      }
    }
  });
  afterAll(() => rm(root, { recursive: true }));

  it('finds the whole server alone', () => {
    const folders = ['missing', 'client', 'half', 'whole'].map((name) => join(root, name));
    expect(findServers(folders)).toEqual([{ folder: join(root, 'whole'), major: 16 }]);
  });
});

describe('right to install', () => {
  it.each([
    ['root', { uid: 0, sudoWorks: () => false }, []],
    ['sudo without a password', { uid: 1000, sudoWorks: () => true }, ['sudo', '-n']],
    ['neither', { uid: 1000, sudoWorks: () => false }, null],
  ])('%s', (_case, who, prefix) => {
    expect(rootPrefix(who)).toEqual(prefix);
  });
});
