import { mkdtemp, readdir, rm, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createStorage } from '../../../server/integrations/storage/create-storage.ts';
import { newObjectKey, StorageMisconfigured } from '../../../server/integrations/storage/object-storage.ts';
import { sweepTempFiles } from '../../../server/integrations/storage/sweep-temp-files.ts';

const sdkLoaded = vi.hoisted(() => vi.fn());
vi.mock('@aws-sdk/client-s3', async (original) => {
  sdkLoaded();
  return original();
});

let folder: string;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'ferrule-create-storage-'));
});
afterEach(() => rm(folder, { recursive: true }));

const S3 = {
  STORAGE: 's3' as const,
  S3_ENDPOINT: 'http://127.0.0.1:1',
  S3_BUCKET: 'b',
  S3_REGION: 'us-east-1',
  S3_ACCESS_KEY_ID: 'k',
  S3_SECRET_ACCESS_KEY: 's',
};

describe('createStorage', () => {
  it('loads the SDK at the first use of a bucket and never for files on disk', async () => {
    const disk = createStorage({ STORAGE: 'disk', UPLOADS_DIR: folder, S3_REGION: 'us-east-1' });
    await disk.put({ bytes: Buffer.from('x') }, newObjectKey(), { mediaType: 'text/plain' });
    const bucket = createStorage({ ...S3, UPLOADS_DIR: folder });
    expect(sdkLoaded).not.toHaveBeenCalled();
    await expect(bucket.stat(newObjectKey())).rejects.toThrow();
    expect(sdkLoaded).toHaveBeenCalled();
  });

  it.each(['S3_ENDPOINT', 'S3_BUCKET', 'S3_ACCESS_KEY_ID', 'S3_SECRET_ACCESS_KEY'] as const)(
    'names %s when it is missing',
    (name) => {
      expect(() => createStorage({ ...S3, UPLOADS_DIR: folder, [name]: undefined })).toThrow(name);
    },
  );

  it.each([
    ['the same folder', 'web', 'web'],
    ['uploads below the pages', 'web', 'web/files'],
    ['pages below the uploads', 'files/web', 'files'],
  ])('refuses %s', (_case, web, uploads) => {
    const env = {
      STORAGE: 'disk' as const,
      S3_REGION: '',
      WEB_DIR: join(folder, web),
      UPLOADS_DIR: join(folder, uploads),
    };
    expect(() => createStorage(env)).toThrow(StorageMisconfigured);
  });

  it('takes neighbours whose names start alike', () => {
    const env = {
      STORAGE: 'disk' as const,
      S3_REGION: '',
      WEB_DIR: join(folder, 'web'),
      UPLOADS_DIR: join(folder, 'web-files'),
    };
    expect(createStorage(env)).toHaveProperty('put');
  });
});

describe('sweepTempFiles', () => {
  it('removes what is old enough and nothing else', async () => {
    const now = Date.now();
    await writeFile(join(folder, 'old'), 'x');
    await writeFile(join(folder, 'new'), 'x');
    await utimes(join(folder, 'old'), (now - 7200_000) / 1000, (now - 7200_000) / 1000);
    expect(await sweepTempFiles(folder, 3600_000, now)).toBe(1);
    expect(await readdir(folder)).toEqual(['new']);
    expect(await sweepTempFiles(join(folder, 'never-made'), 3600_000, now)).toBe(0);
  });
});
