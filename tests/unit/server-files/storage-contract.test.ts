import { createHash, randomBytes } from 'node:crypto';
import { mkdtemp, readdir, rm, stat, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LocalDiskStorage } from '../../../server/integrations/storage/local-disk-storage.ts';
import {
  newObjectKey,
  ObjectKeyInvalid,
  ObjectMissing,
  ObjectSizeWrong,
  ObjectSpanInvalid,
  type ObjectStorage,
} from '../../../server/integrations/storage/object-storage.ts';
import { S3Storage } from '../../../server/integrations/storage/s3-storage.ts';
import { startFakeS3, type FakeS3 } from '../../support/fake-s3.ts';

interface Bench {
  storage: ObjectStorage;
  /** Things that a failed or finished write must not leave behind. */
  leftovers(): Promise<number>;
  close(): Promise<void>;
}

const BENCHES: [string, () => Promise<Bench>][] = [
  [
    'local disk',
    async () => {
      const root = await mkdtemp(join(tmpdir(), 'ferrule-storage-'));
      return {
        storage: new LocalDiskStorage(root),
        leftovers: async () => (await readdir(join(root, 'incoming-objects')).catch(() => [])).length,
        close: () => rm(root, { recursive: true }),
      };
    },
  ],
  [
    'S3',
    async () => {
      const fake = await startFakeS3();
      return {
        storage: new S3Storage(fake),
        leftovers: () => Promise.resolve(fake.openUploads.size),
        close: () => fake.close(),
      };
    },
  ],
];

const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');
const MEDIA = { mediaType: 'application/octet-stream' };

describe.each(BENCHES)('object storage on %s', (_name, open) => {
  let bench: Bench;
  beforeAll(async () => {
    bench = await open();
  });
  afterAll(() => bench.close());

  it('gives back what was put, from bytes, a stream and a file', async () => {
    const bytes = randomBytes(70_000);
    const folder = await mkdtemp(join(tmpdir(), 'ferrule-source-'));
    const filePath = join(folder, 'source');
    await writeFile(filePath, bytes);
    const sources = [{ bytes }, { stream: Readable.from([bytes.subarray(0, 9), bytes.subarray(9)]) }, { filePath }];
    for (const source of sources) {
      const key = newObjectKey();
      expect(await bench.storage.put(source, key, { ...MEDIA, byteSize: bytes.length })).toEqual({ byteSize: 70_000 });
      const opened = await bench.storage.openRead(key);
      expect(opened.byteSize).toBe(70_000);
      expect(sha256(await buffer(opened.stream))).toBe(sha256(bytes));
      expect(await bench.storage.stat(key)).toEqual({ byteSize: 70_000 });
    }
    expect((await stat(filePath)).size).toBe(70_000);
    await rm(folder, { recursive: true });
  });

  it('keeps an empty object', async () => {
    const key = newObjectKey();
    expect(await bench.storage.put({ bytes: Buffer.alloc(0) }, key, MEDIA)).toEqual({ byteSize: 0 });
    expect(await bench.storage.stat(key)).toEqual({ byteSize: 0 });
    expect(await buffer((await bench.storage.openRead(key)).stream)).toHaveLength(0);
  });

  it('keeps 12 MB from a stream of unknown length', async () => {
    const part = randomBytes(1_000_000);
    const key = newObjectKey();
    const stream = Readable.from(Array.from({ length: 12 }, () => part));
    expect(await bench.storage.put({ stream }, key, MEDIA)).toEqual({ byteSize: 12_000_000 });
    const opened = await bench.storage.openRead(key);
    expect(sha256(await buffer(opened.stream))).toBe(sha256(Buffer.concat(Array.from({ length: 12 }, () => part))));
    expect(await bench.leftovers()).toBe(0);
  });

  it('reads a part, first and last byte counted in', async () => {
    const key = newObjectKey();
    await bench.storage.put({ bytes: Buffer.from('0123456789') }, key, MEDIA);
    const read = async (start: number, end: number): Promise<string> => {
      const { stream, byteSize } = await bench.storage.openRead(key, { start, end });
      const bytes = await buffer(stream);
      expect(bytes).toHaveLength(byteSize);
      return bytes.toString();
    };
    expect(await read(0, 0)).toBe('0');
    expect(await read(3, 6)).toBe('3456');
    expect(await read(9, 9)).toBe('9');
    for (const [start, end] of [
      [0, 10],
      [10, 10],
      [5, 4],
      [-1, 3],
      [0.5, 3],
    ] as const)
      await expect(bench.storage.openRead(key, { start, end })).rejects.toBeInstanceOf(ObjectSpanInvalid);
  });

  it('replaces an object whole', async () => {
    const key = newObjectKey();
    await bench.storage.put({ bytes: Buffer.from('the first and longer one') }, key, MEDIA);
    await bench.storage.put({ bytes: Buffer.from('second') }, key, MEDIA);
    expect((await buffer((await bench.storage.openRead(key)).stream)).toString()).toBe('second');
  });

  it('removes an object, and again without complaint', async () => {
    const key = newObjectKey();
    await bench.storage.put({ bytes: Buffer.from('x') }, key, MEDIA);
    expect(await bench.storage.exists(key)).toBe(true);
    await bench.storage.remove(key);
    await bench.storage.remove(key);
    expect(await bench.storage.exists(key)).toBe(false);
    expect(await bench.storage.stat(key)).toBeNull();
    await expect(bench.storage.openRead(key)).rejects.toBeInstanceOf(ObjectMissing);
  });

  it.each([
    ['too few bytes', 11],
    ['too many bytes', 9],
  ])('stores nothing when there are %s', async (_case, byteSize) => {
    const key = newObjectKey();
    const put = bench.storage.put({ bytes: Buffer.from('0123456789') }, key, { ...MEDIA, byteSize });
    await expect(put).rejects.toBeInstanceOf(ObjectSizeWrong);
    expect(await bench.storage.exists(key)).toBe(false);
    expect(await bench.leftovers()).toBe(0);
  });

  it('stores nothing when the source breaks in the middle, early or after 12 MB', async () => {
    for (const parts of [1, 12]) {
      const key = newObjectKey();
      const breaking = Readable.from(
        (function* () {
          for (let sent = 0; sent < parts; sent += 1) yield Buffer.alloc(1_000_000);
          throw new Error('the source broke');
        })(),
      );
      await expect(bench.storage.put({ stream: breaking }, key, MEDIA)).rejects.toThrow('the source broke');
      expect(await bench.storage.exists(key)).toBe(false);
      expect(await bench.leftovers()).toBe(0);
    }
  });

  it('keeps the earlier object when its replacement breaks', async () => {
    const key = newObjectKey();
    await bench.storage.put({ bytes: Buffer.from('kept') }, key, MEDIA);
    await expect(bench.storage.put({ bytes: Buffer.from('12') }, key, { ...MEDIA, byteSize: 3 })).rejects.toThrow();
    expect((await buffer((await bench.storage.openRead(key)).stream)).toString()).toBe('kept');
  });

  it.each([
    ['a way up', '../outside-the-store'],
    ['a path', 'ab/cd'],
    ['nothing', ''],
    ['capital letters', 'A'.repeat(32)],
    ['a NUL', `${'a'.repeat(31)}\0`],
    ['a line after the name', `${'a'.repeat(32)}\n`],
  ])('refuses %s as a key in every operation', async (_case, key) => {
    const { storage } = bench;
    await expect(storage.put({ bytes: Buffer.from('x') }, key, MEDIA)).rejects.toBeInstanceOf(ObjectKeyInvalid);
    await expect(storage.openRead(key)).rejects.toBeInstanceOf(ObjectKeyInvalid);
    await expect(storage.stat(key)).rejects.toBeInstanceOf(ObjectKeyInvalid);
    await expect(storage.exists(key)).rejects.toBeInstanceOf(ObjectKeyInvalid);
    await expect(storage.remove(key)).rejects.toBeInstanceOf(ObjectKeyInvalid);
  });
});

describe('local disk', () => {
  it('shards in two levels and lets nobody else on the machine read', async () => {
    const root = await mkdtemp(join(tmpdir(), 'ferrule-storage-'));
    const key = 'abcdef0123456789abcdef0123456789';
    await new LocalDiskStorage(root).put({ bytes: Buffer.from('x') }, key, MEDIA);
    const found = await stat(join(root, 'objects', 'ab', 'cd', key));
    expect(found.mode & 0o777).toBe(0o600);
    expect((await stat(join(root, 'objects', 'ab'))).mode & 0o777).toBe(0o700);
    await rm(root, { recursive: true });
  });
});

describe('S3', () => {
  let fake: FakeS3;
  beforeAll(async () => {
    fake = await startFakeS3();
  });
  afterAll(() => fake.close());

  it('writes the media type, large objects in parts, and signs every request', async () => {
    const storage = new S3Storage(fake);
    const [small, large] = [newObjectKey(), newObjectKey()];
    await storage.put({ bytes: Buffer.from('x') }, small, { mediaType: 'image/webp' });
    await storage.put({ bytes: Buffer.alloc(11_000_000, 7) }, large, { mediaType: 'video/mp4' });
    expect(fake.objects.get(small)?.mediaType).toBe('image/webp');
    expect(fake.objects.get(large)?.mediaType).toBe('video/mp4');
    expect(fake.requests.filter((line) => line.includes('partNumber='))).toHaveLength(3);
    expect((await fetch(`${fake.endpoint}/${fake.bucket}/${small}`)).status).toBe(403);
  });

  it('passes on a refusal that is not about a missing object', async () => {
    const storage = new S3Storage({ ...fake, accessKeyId: 'SOMEONEELSE' });
    await expect(storage.stat(newObjectKey())).rejects.toMatchObject({ $metadata: { httpStatusCode: 403 } });
    await expect(storage.put({ bytes: Buffer.from('x') }, newObjectKey(), MEDIA)).rejects.toThrow();
  });
});
