import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, open, rename, rm, stat } from 'node:fs/promises';
import { dirname, join, resolve } from 'node:path';
import { pipeline } from 'node:stream/promises';
import {
  assertObjectKey,
  assertSpan,
  newObjectKey,
  ObjectMissing,
  type ByteSpan,
  type ObjectSource,
  type ObjectStorage,
  type OpenObject,
  type PutOptions,
  type StoredObject,
} from './object-storage.ts';
import { CountedBytes, openSource } from './object-source.ts';

const PRIVATE_FOLDER = 0o700;
const PRIVATE_FILE = 0o600;

const isMissing = (error: unknown): boolean => (error as NodeJS.ErrnoException).code === 'ENOENT';

/** Makes a new name in a folder survive a power cut; the file's own bytes are flushed before. */
async function flushFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/**
 * Objects as files below one folder, in two levels of 256 folders so that none grows long. A file is written beside
 * the objects, flushed, and then renamed, so that a reader or a crash never sees half of it.
 */
export class LocalDiskStorage implements ObjectStorage {
  readonly #root: string;
  readonly #incoming: string;

  /** @param root a folder of its own that no web server serves. */
  constructor(root: string) {
    this.#root = resolve(root, 'objects');
    this.#incoming = resolve(root, 'incoming-objects');
  }

  async put(source: ObjectSource, key: string, { byteSize }: PutOptions): Promise<StoredObject> {
    const path = this.#pathOf(key);
    await mkdir(this.#incoming, { recursive: true, mode: PRIVATE_FOLDER });
    const temporary = join(this.#incoming, newObjectKey());
    const counted = new CountedBytes(byteSize);
    try {
      const writer = createWriteStream(temporary, { flags: 'wx', mode: PRIVATE_FILE, flush: true });
      await pipeline(openSource(source), counted, writer);
      await mkdir(dirname(path), { recursive: true, mode: PRIVATE_FOLDER });
      await rename(temporary, path);
      await flushFolder(dirname(path));
    } catch (error) {
      await rm(temporary, { force: true });
      throw error;
    }
    return { byteSize: counted.byteSize };
  }

  async openRead(key: string, span?: ByteSpan): Promise<OpenObject> {
    const path = this.#pathOf(key);
    const handle = await open(path, 'r').catch((error: unknown) => {
      throw isMissing(error) ? new ObjectMissing(`There is no object ${key}.`) : error;
    });
    try {
      const { size } = await handle.stat();
      if (span) assertSpan(span, size);
      return {
        stream: createReadStream(path, { fd: handle, autoClose: true, ...span }),
        byteSize: span ? span.end - span.start + 1 : size,
      };
    } catch (error) {
      await handle.close();
      throw error;
    }
  }

  async stat(key: string): Promise<StoredObject | null> {
    try {
      return { byteSize: (await stat(this.#pathOf(key))).size };
    } catch (error) {
      if (isMissing(error)) return null;
      throw error;
    }
  }

  async exists(key: string): Promise<boolean> {
    return (await this.stat(key)) !== null;
  }

  async remove(key: string): Promise<void> {
    await rm(this.#pathOf(key), { force: true });
  }

  #pathOf(key: string): string {
    assertObjectKey(key);
    return join(this.#root, key.slice(0, 2), key.slice(2, 4), key);
  }
}
