import type { FileHandle } from 'node:fs/promises';
import { FileRefusedError } from './file-refused-error.ts';

/** One box of an ISO base media file (ISO/IEC 14496-12, 4.2); offsets and sizes in bytes from the file's start. */
export interface Box {
  /** Four characters, read as Latin-1. */
  readonly type: string;
  readonly start: number;
  /** First byte after size and type. */
  readonly bodyStart: number;
  readonly end: number;
}

/** A file with more boxes than this is not a recording but an attempt to keep us busy. */
const BOXES_MAX = 200_000;
/** Read at once, since headers of small boxes lie close together. */
const WINDOW_BYTES = 4096;

export const videoUnreadable = (): FileRefusedError =>
  new FileRefusedError(
    'video-unreadable',
    'This video is damaged or built in a way that Ferrule cannot check for places, so nothing of it was kept. Export it again as MP4 and send that.',
  );

/** Reads and overwrites boxes of one open file; only headers and tables are ever held in memory. */
export class BoxFile {
  readonly #handle: FileHandle;
  readonly byteSize: number;
  #seen = 0;
  #window = Buffer.alloc(0);
  #windowStart = 0;

  constructor(handle: FileHandle, byteSize: number) {
    this.#handle = handle;
    this.byteSize = byteSize;
  }

  /** Exactly `length` bytes. @throws FileRefusedError where the file ends before. */
  async read(at: number, length: number): Promise<Buffer> {
    const from = at - this.#windowStart;
    if (from >= 0 && from + length <= this.#window.length) return this.#window.subarray(from, from + length);
    const wanted = Math.max(length, WINDOW_BYTES);
    const { bytesRead, buffer } = await this.#handle.read(Buffer.alloc(wanted), 0, wanted, at);
    if (bytesRead < length) throw videoUnreadable();
    this.#window = buffer.subarray(0, Math.min(bytesRead, WINDOW_BYTES));
    this.#windowStart = at;
    return buffer.subarray(0, length);
  }

  async write(at: number, bytes: Uint8Array): Promise<void> {
    this.#window = Buffer.alloc(0);
    await this.#handle.write(bytes, 0, bytes.length, at);
  }

  /** Overwrites a range with one byte value, in pieces. */
  async fill(start: number, end: number, value: number): Promise<void> {
    const piece = Buffer.alloc(Math.min(64 * 1024, Math.max(0, end - start)), value);
    for (let at = start; at < end; at += piece.length)
      await this.write(at, piece.subarray(0, Math.min(piece.length, end - at)));
  }

  /** Makes a box one that readers skip, with nothing in it; its length and so every offset after it stay. */
  async blank(box: Box): Promise<void> {
    await this.fill(box.bodyStart, box.end, 0);
    await this.write(box.start + 4, Buffer.from('free', 'latin1'));
  }

  /**
   * The boxes between two offsets, one after the other. Fewer than eight bytes at the end are padding (a `udta` may end
   * with four zero bytes).
   * @throws FileRefusedError where a box claims more than its parent holds
   */
  async *boxes(from: number, to: number): AsyncGenerator<Box> {
    let start = from;
    while (to - start >= 8) {
      this.#seen += 1;
      if (this.#seen > BOXES_MAX) throw videoUnreadable();
      const head = await this.read(start, 8);
      const type = head.toString('latin1', 4, 8);
      let size = head.readUInt32BE(0);
      let bodyStart = start + 8;
      if (size === 1) {
        size = Number((await this.read(bodyStart, 8)).readBigUInt64BE(0));
        bodyStart += 8;
      } else if (size === 0) size = to - start;
      const end = start + size;
      if (!Number.isSafeInteger(end) || end < bodyStart || end > to) throw videoUnreadable();
      yield { type, start, bodyStart, end };
      start = end;
    }
  }
}
