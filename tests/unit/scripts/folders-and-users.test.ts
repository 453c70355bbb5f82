import { mkdir, mkdtemp, readFile, rm, stat, symlink, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { wantsDemo } from '../../../server/scripts/demo.mjs';
import { dataFolder, isInside, prepareFolder, throwAwayFolder } from '../../../server/scripts/folders.mjs';
import { appEnvironment, localOrigin } from '../../../server/scripts/given-environment.mjs';
import { loadSecrets } from '../../../server/scripts/secrets.mjs';
import { pickUser } from '../../../server/scripts/unprivileged-user.mjs';

const place = { checkout: '/srv/ferrule', env: {}, uid: 1000, home: '/home/u', temporary: '/tmp' };

describe('data folder', () => {
  it('lies with the state of the user, or under /var/lib for root', () => {
    expect(dataFolder(place)).toMatch(/^\/home\/u\/\.local\/state\/ferrule\/[0-9a-f]{12}$/);
    expect(dataFolder({ ...place, env: { XDG_STATE_HOME: '/state' } })).toMatch(/^\/state\/ferrule\/[0-9a-f]{12}$/);
    expect(dataFolder({ ...place, uid: 0 })).toMatch(/^\/var\/lib\/ferrule-[0-9a-f]{12}$/);
    expect(dataFolder({ ...place, env: { FERRULE_DATA_DIR: '/data' }, flavour: 'dev' })).toBe('/data-dev');
  });

  it('differs from checkout to checkout', () => {
    expect(dataFolder(place)).not.toBe(dataFolder({ ...place, checkout: '/srv/other' }));
  });

  it('is refused in the checkout and in the temporary folder', () => {
    expect(() => dataFolder({ ...place, env: { FERRULE_DATA_DIR: 'data' } })).toThrow('inside the checkout');
    expect(() => dataFolder({ ...place, env: { FERRULE_DATA_DIR: '/tmp/data' } })).toThrow('temporary folder');
  });

  it('tells inside from beside', () => {
    expect(isInside('/a', '/a/b')).toBe(true);
    expect(isInside('/a', '/ab')).toBe(false);
    expect(throwAwayFolder({ checkout: '/srv', uid: 7, base: '/tmp', name: 'test' })).toMatch(
      /^\/tmp\/ferrule-test-7-[0-9a-f]{12}$/,
    );
  });
});

describe('user that the database runs as', () => {
  const nobody = 'nobody:x:65534:65534:nobody:/nonexistent:/usr/sbin/nologin';
  it('is postgres, else nobody, never root', () => {
    expect(
      pickUser(`root:x:0:0::/root:/bin/sh\n${nobody}\npostgres:x:101:104::/var/lib/postgresql:/bin/bash\n`),
    ).toEqual({ name: 'postgres', uid: 101, gid: 104 });
    expect(pickUser(nobody)).toEqual({ name: 'nobody', uid: 65534, gid: 65534 });
    expect(pickUser('postgres:x:0:0::/:/bin/sh')).toBeNull();
    expect(pickUser('x')).toBeNull();
  });
});

describe('files of the data folder', () => {
  const uid = process.getuid?.() ?? 0;
  let root = '';
  beforeEach(async () => void (root = await mkdtemp(join(tmpdir(), 'ferrule-folders-'))));
  afterEach(() => rm(root, { recursive: true }));

  it('refuses a link and a folder of somebody else', async () => {
    await mkdir(join(root, 'real'));
    await symlink(join(root, 'real'), join(root, 'link'));
    expect(() => prepareFolder(join(root, 'link'), uid)).toThrow('not a folder of yours');
    expect(() => prepareFolder(join(root, 'real'), uid + 1)).toThrow('not a folder of yours');
    prepareFolder(join(root, 'deep', 'new'), uid);
    expect((await stat(join(root, 'deep', 'new'))).isDirectory()).toBe(true);
  });

  it('makes secrets once, for their owner alone, and never replaces damaged ones', async () => {
    const made = loadSecrets(root);
    expect(loadSecrets(root)).toEqual(made);
    expect(new Set(Object.values(made)).size).toBe(4);
    expect((await stat(join(root, 'secrets.json'))).mode & 0o777).toBe(0o600);
    await writeFile(join(root, 'secrets.json'), '{"sessionSecret":');
    expect(() => loadSecrets(root)).toThrow('damaged');
    expect(await readFile(join(root, 'secrets.json'), 'utf8')).toBe('{"sessionSecret":');
  });
});

describe("the application's environment", () => {
  const secrets = { sessionSecret: 's', fieldKey: 'f', adminPassword: 'a', appPassword: 'p' };
  const run = { folder: '/data', secrets, databaseUrl: 'postgres://own', port: 4311, origin: 'http://127.0.0.1:4311' };

  it('fills in what the person did not set, and holds no password of the database', () => {
    const filled = appEnvironment({ ...run, env: { LOG_LEVEL: 'debug', SESSION_SECRET: '', PORT: '1' } });
    expect(filled).toMatchObject({
      LOG_LEVEL: 'debug',
      SESSION_SECRET: 's',
      PORT: '4311',
      DATABASE_URL: 'postgres://own',
      UPLOADS_DIR: '/data/uploads',
    });
    expect(Object.values(filled)).not.toContain('a');
  });

  it('reaches a server that listens everywhere by loopback', () => {
    expect([undefined, '0.0.0.0', '::', '::1', '10.0.0.5'].map((host) => localOrigin(host, 80))).toEqual([
      'http://127.0.0.1:80',
      'http://127.0.0.1:80',
      'http://127.0.0.1:80',
      'http://[::1]:80',
      'http://10.0.0.5:80',
    ]);
  });

  it('puts the demo into a database of our own, and into a named one only when asked', () => {
    expect(wantsDemo({ wish: undefined, own: true })).toBe(true);
    expect(wantsDemo({ wish: undefined, own: false })).toBe(false);
    expect(wantsDemo({ wish: '1', own: false })).toBe(true);
    expect(wantsDemo({ wish: '0', own: true })).toBe(false);
  });
});
