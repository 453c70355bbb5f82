import { isAbsolute, relative, resolve } from 'node:path';
import type { Env } from '../../config/env.ts';
import { LocalDiskStorage } from './local-disk-storage.ts';
import { StorageMisconfigured, type ObjectStorage } from './object-storage.ts';
import { S3Storage } from './s3-storage.ts';

type StorageEnv = Pick<
  Env,
  | 'STORAGE'
  | 'UPLOADS_DIR'
  | 'WEB_DIR'
  | 'S3_ENDPOINT'
  | 'S3_BUCKET'
  | 'S3_REGION'
  | 'S3_ACCESS_KEY_ID'
  | 'S3_SECRET_ACCESS_KEY'
>;

/** Whether `inner` is `outer` or below it. */
function isWithin(outer: string, inner: string): boolean {
  const way = relative(resolve(outer), resolve(inner));
  return way === '' || (!way.startsWith('..') && !isAbsolute(way));
}

/**
 * The storage the configuration asks for.
 * @throws StorageMisconfigured naming the variable that is missing, or where uploads would lie in a served folder.
 */
export function createStorage(env: StorageEnv): ObjectStorage {
  if (env.WEB_DIR !== undefined && (isWithin(env.WEB_DIR, env.UPLOADS_DIR) || isWithin(env.UPLOADS_DIR, env.WEB_DIR)))
    throw new StorageMisconfigured(
      'UPLOADS_DIR and WEB_DIR must lie apart: what is uploaded must not be served as pages.',
    );
  if (env.STORAGE === 'disk') return new LocalDiskStorage(env.UPLOADS_DIR);
  const needed = <K extends keyof StorageEnv>(name: K): string => {
    const value = env[name];
    if (!value) throw new StorageMisconfigured(`${name} is needed with STORAGE=s3.`);
    return value;
  };
  return new S3Storage({
    endpoint: needed('S3_ENDPOINT'),
    bucket: needed('S3_BUCKET'),
    region: env.S3_REGION,
    accessKeyId: needed('S3_ACCESS_KEY_ID'),
    secretAccessKey: needed('S3_SECRET_ACCESS_KEY'),
  });
}
