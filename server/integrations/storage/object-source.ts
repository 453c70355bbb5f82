import { createReadStream } from 'node:fs';
import { Readable, Transform } from 'node:stream';
import { ObjectSizeWrong, type ObjectSource } from './object-storage.ts';

/** Opens a source as one stream. */
export function openSource(source: ObjectSource): Readable {
  if ('stream' in source) return source.stream;
  if ('filePath' in source) return createReadStream(source.filePath);
  return Readable.from([source.bytes], { objectMode: false });
}

/** Passes bytes on and counts them; fails at the first byte too many and at an end that comes too early. */
export class CountedBytes extends Transform {
  byteSize = 0;
  readonly #expected: number | undefined;

  constructor(expectedByteSize?: number) {
    super();
    this.#expected = expectedByteSize;
  }

  override _transform(
    chunk: Buffer,
    _encoding: BufferEncoding,
    done: (error?: Error | null, data?: Buffer) => void,
  ): void {
    this.byteSize += chunk.length;
    if (this.#expected !== undefined && this.byteSize > this.#expected) done(this.#wrong());
    else done(null, chunk);
  }

  override _flush(done: (error?: Error | null) => void): void {
    done(this.#expected !== undefined && this.byteSize !== this.#expected ? this.#wrong() : null);
  }

  #wrong(): ObjectSizeWrong {
    return new ObjectSizeWrong(`Expected ${this.#expected} bytes, saw ${this.byteSize}.`);
  }
}
