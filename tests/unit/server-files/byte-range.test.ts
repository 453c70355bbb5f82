import { createHash } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import express, { type ErrorRequestHandler } from 'express';
import fc from 'fast-check';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { AppError } from '../../../server/errors.ts';
import { askedRange, contentDisposition, sendStoredBytes, type StoredBytes } from '../../../server/http/byte-range.ts';
import { LocalDiskStorage } from '../../../server/integrations/storage/local-disk-storage.ts';
import { newObjectKey, type ObjectStorage } from '../../../server/integrations/storage/object-storage.ts';

describe('askedRange (RFC 9110, 14.1.2, with its examples for 10,000 bytes)', () => {
  it.each([
    ['bytes=0-499', { start: 0, end: 499 }],
    ['bytes=500-999', { start: 500, end: 999 }],
    ['bytes=-500', { start: 9500, end: 9999 }],
    ['bytes=9500-', { start: 9500, end: 9999 }],
    ['bytes=0-0', { start: 0, end: 0 }],
    ['bytes=0-99999', { start: 0, end: 9999 }],
    ['bytes=-99999', { start: 0, end: 9999 }],
    ['BYTES=0-1', { start: 0, end: 1 }],
    [`bytes=0-${'9'.repeat(400)}`, { start: 0, end: 9999 }],
    [`bytes=-${'9'.repeat(400)}`, { start: 0, end: 9999 }],
    ['bytes=10000-', 'unsatisfiable'],
    ['bytes=10000-10001', 'unsatisfiable'],
    [`bytes=${'9'.repeat(400)}-`, 'unsatisfiable'],
    ['bytes=-0', 'unsatisfiable'],
    [undefined, 'whole'],
    ['', 'whole'],
    ['bytes', 'whole'],
    ['bytes=', 'whole'],
    ['bytes=-', 'whole'],
    ['bytes=5-4', 'whole'],
    ['bytes=a-b', 'whole'],
    ['bytes=1.5-2', 'whole'],
    ['bytes=--5', 'whole'],
    ['items=0-5', 'whole'],
    ['bytes=0-0,-1', 'whole'],
    [`bytes=${'0-,'.repeat(5000)}0-`, 'whole'],
    ['bytes=0-5\r\nX: y', 'whole'],
  ])('%j', (header, asked) => {
    expect(askedRange(header, 10_000)).toEqual(asked);
  });

  it.each(['bytes=0-', 'bytes=-5', 'bytes=0-0'])('of an empty file, %s cannot be met', (header) => {
    expect(askedRange(header, 0)).toBe('unsatisfiable');
  });

  it('never leaves the file, for any numbers', () => {
    fc.assert(
      fc.property(fc.nat(), fc.nat(), fc.nat(1_000_000), (first, last, byteSize) => {
        const asked = askedRange(`bytes=${first}-${last}`, byteSize);
        if (typeof asked === 'string') expect(asked).toBe(last < first ? 'whole' : 'unsatisfiable');
        else expect(asked).toEqual({ start: first, end: Math.min(last, byteSize - 1) });
      }),
    );
  });
});

describe('sendStoredBytes', () => {
  const BYTES = Buffer.from(Array.from({ length: 1000 }, (_, at) => at % 251));
  const SHA256 = createHash('sha256').update(BYTES).digest('hex');
  let folder: string;
  let storage: ObjectStorage;
  let server: Server;
  let origin: string;
  let file: StoredBytes;
  let using: ObjectStorage;
  let thrown: unknown[];

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'ferrule-range-'));
    storage = new LocalDiskStorage(folder);
    const key = newObjectKey();
    await storage.put({ bytes: BYTES }, key, { mediaType: 'video/mp4' });
    file = { key, byteSize: 1000, mediaType: 'video/mp4', sha256: SHA256, name: 'bench test.mp4' };
    const app = express();
    app.get('/', (req, res) => sendStoredBytes(req, res, using, { ...file, ...(req.query as object) }));
    const onError: ErrorRequestHandler = (error, _req, res, _next) => {
      thrown.push(error);
      if (res.headersSent) return;
      res.status(error instanceof AppError && error.code === 'range-not-satisfiable' ? 416 : 500).json({});
    };
    app.use(onError);
    server = app.listen(0, '127.0.0.1');
    await new Promise((resolve) => server.once('listening', resolve));
    origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}/`;
  });
  afterAll(async () => {
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
    await rm(folder, { recursive: true });
  });
  beforeEach(() => {
    using = storage;
    thrown = [];
  });

  const get = async (
    headers: Record<string, string> = {},
    query = '',
    method = 'GET',
  ): Promise<{ response: Response; bytes: Buffer }> => {
    const response = await fetch(origin + query, { method, headers });
    return { response, bytes: Buffer.from(await response.arrayBuffer()) };
  };

  it('sends the whole with a strong ETag, its length, and headers that keep browsers from guessing', async () => {
    const { response, bytes } = await get();
    expect(response.status).toBe(200);
    expect(bytes.equals(BYTES)).toBe(true);
    const headers = Object.fromEntries(response.headers);
    expect(headers).toMatchObject({
      'content-type': 'video/mp4',
      'content-length': '1000',
      'accept-ranges': 'bytes',
      etag: `"${SHA256}"`,
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-cache',
      'cross-origin-resource-policy': 'same-origin',
    });
    expect(headers['content-security-policy']).toMatch(/^default-src 'none';.*; sandbox$/);
    expect(headers['content-disposition']).toMatch(/^inline; /);
  });

  it('sends a part with 206', async () => {
    const { response, bytes } = await get({ range: 'bytes=100-199' });
    expect(response.status).toBe(206);
    expect(response.headers.get('content-range')).toBe('bytes 100-199/1000');
    expect(response.headers.get('content-length')).toBe('100');
    expect(bytes.equals(BYTES.subarray(100, 200))).toBe(true);
    expect((await get({ range: 'bytes=-1' })).bytes.equals(BYTES.subarray(999))).toBe(true);
  });

  it('answers 416 with the size where there is no such part', async () => {
    const { response } = await get({ range: 'bytes=1000-' });
    expect(response.status).toBe(416);
    expect(response.headers.get('content-range')).toBe('bytes */1000');
  });

  it('joins a part only to the same version', async () => {
    expect((await get({ range: 'bytes=0-9', 'if-range': `"${SHA256}"` })).response.status).toBe(206);
    for (const other of ['"another"', `W/"${SHA256}"`, 'Tue, 01 Dec 2026 12:00:00 GMT', SHA256]) {
      const { response, bytes } = await get({ range: 'bytes=0-9', 'if-range': other });
      expect([response.status, bytes.length]).toEqual([200, 1000]);
    }
    // RFC 9110, 13.1.5: with another version even an impossible range is answered with the whole.
    expect((await get({ range: 'bytes=5000-', 'if-range': '"another"' })).response.status).toBe(200);
  });

  it('answers several ranges with the whole', async () => {
    const { response, bytes } = await get({ range: 'bytes=0-1,5-6' });
    expect([response.status, bytes.length]).toEqual([200, 1000]);
  });

  it('answers 304 to one who has it', async () => {
    for (const known of [`"${SHA256}"`, `W/"${SHA256}"`, `"x", "${SHA256}"`, '*']) {
      const { response, bytes } = await get({ 'if-none-match': known, range: 'bytes=0-9' });
      expect([response.status, bytes.length]).toEqual([304, 0]);
      expect(response.headers.get('etag')).toBe(`"${SHA256}"`);
      expect(response.headers.get('cache-control')).toBe('private, no-cache');
    }
    expect((await get({ 'if-none-match': '"x"' })).response.status).toBe(200);
  });

  it('describes without sending for HEAD, ranges aside, and opens nothing', async () => {
    const openRead = vi.fn<ObjectStorage['openRead']>();
    using = { ...storage, openRead };
    const { response } = await get({ range: 'bytes=0-9' }, '', 'HEAD');
    expect(response.status).toBe(200);
    expect(response.headers.get('content-length')).toBe('1000');
    expect(openRead).not.toHaveBeenCalled();
  });

  it.each([
    ['image/webp', 'inline'],
    ['audio/wav', 'inline'],
    ['application/pdf', 'attachment'],
    ['text/plain', 'attachment'],
    ['application/zip', 'attachment'],
    ['image/svg+xml', 'attachment'],
    ['text/html', 'attachment'],
  ])('%s is %s', async (mediaType, kind) => {
    const { response } = await get({}, `?mediaType=${encodeURIComponent(mediaType)}`);
    expect(response.headers.get('content-disposition')).toMatch(new RegExp(`^${kind}; `));
    expect(response.headers.get('content-type')).toMatch(
      new RegExp(`^${mediaType.replace('+', '\\+')}(; charset=utf-8)?$`),
    );
  });

  it('cuts the connection when the stream breaks, instead of ending short', async () => {
    const breaking = (): Readable =>
      Readable.from(
        (async function* () {
          yield BYTES.subarray(0, 500);
          await new Promise((resolve) => setTimeout(resolve, 20));
          throw new Error('the disk broke');
        })(),
      );
    using = { ...storage, openRead: () => Promise.resolve({ stream: breaking(), byteSize: 1000 }) };
    await expect(get()).rejects.toThrow();
    await vi.waitFor(() => expect(thrown).toEqual([new Error('the disk broke')]));
  });

  it('says so before the first byte when the object is gone or has another size', async () => {
    const gone = await get({}, `?key=${newObjectKey()}`);
    expect(gone.response.status).toBe(500);
    expect(gone.response.headers.get('content-disposition')).toBeNull();
    using = { ...storage, openRead: () => Promise.resolve({ stream: Readable.from([BYTES]), byteSize: 999 }) };
    expect((await get()).response.status).toBe(500);
  });

  it('lets go of the object when the reader leaves, without calling it a fault', async () => {
    const stream = new Readable({ read: () => undefined });
    stream.push(BYTES.subarray(0, 10));
    using = { ...storage, openRead: () => Promise.resolve({ stream, byteSize: 1000 }) };
    const leaving = new AbortController();
    const response = await fetch(origin, { signal: leaving.signal });
    leaving.abort();
    await expect(response.arrayBuffer()).rejects.toThrow();
    await vi.waitFor(() => expect(stream.destroyed).toBe(true));
    expect(thrown).toEqual([]);
  });
});

describe('contentDisposition', () => {
  it('writes any name without breaking out of its quotes or its line', () => {
    expect(contentDisposition('Länge "a"; x=1\r\nX: y.webp', 'image/webp')).toBe(
      `inline; filename="L_nge _a_; x=1__X: y.webp"; filename*=UTF-8''L%C3%A4nge%20%22a%22%3B%20x%3D1%0D%0AX%3A%20y.webp`,
    );
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (name) => {
        expect(contentDisposition(name, 'application/pdf')).toMatch(
          /^attachment; filename="[^"\\\r\n]*"; filename\*=UTF-8''[\w.~%-]*$/,
        );
      }),
    );
  });
});
