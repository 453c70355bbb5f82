import { createHash, randomBytes } from 'node:crypto';
import { access, mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import type { AddressInfo, Socket } from 'node:net';
import { connect } from 'node:net';
import type { Server } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express, { type ErrorRequestHandler } from 'express';
import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { createUploadReceiver, incomingFolder, type ReceivedForm } from '../../../server/http/multipart.ts';
import { FileRefusedError } from '../../../server/integrations/images/file-refused-error.ts';

const MAX_BYTES = 300_000;
const BOUNDARY = 'xxFERRULExx';

let uploadsDir: string;
let server: Server;
let port: number;
let received: ReceivedForm | undefined;
let failures: unknown[];
let keepFiles = false;

const leftovers = async (): Promise<string[]> => readdir(incomingFolder(uploadsDir)).catch(() => []);

beforeAll(async () => {
  uploadsDir = await mkdtemp(join(tmpdir(), 'ferrule-multipart-'));
  const receive = createUploadReceiver({ uploadsDir, maxFileBytes: MAX_BYTES });
  const app = express();
  app.post('/', async (req, res) => {
    const form = await receive(req, res);
    received = form;
    if (!keepFiles) await form.file.discard();
    res.json({ ...form.file, fields: form.fields });
  });
  const onError: ErrorRequestHandler = (thrown, _req, res, _next) => {
    failures.push(thrown);
    if (!res.headersSent && !res.destroyed)
      res
        .status(thrown instanceof FileRefusedError ? 422 : 500)
        .json(thrown instanceof FileRefusedError ? { code: thrown.code, words: thrown.words } : {});
  };
  app.use(onError);
  server = app.listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  port = (server.address() as AddressInfo).port;
});
afterAll(async () => {
  server.closeAllConnections();
  await new Promise((resolve) => server.close(resolve));
  await rm(uploadsDir, { recursive: true });
});
beforeEach(() => {
  received = undefined;
  failures = [];
  keepFiles = false;
});

const filePart = (name: string, content: Uint8Array, field = 'file'): Buffer =>
  Buffer.concat([
    Buffer.from(
      `--${BOUNDARY}\r\nContent-Disposition: form-data; name="${field}"; filename="${name}"\r\nContent-Type: image/png\r\n\r\n`,
    ),
    content,
    Buffer.from('\r\n'),
  ]);
const fieldPart = (name: string, value: string): Buffer =>
  Buffer.from(`--${BOUNDARY}\r\nContent-Disposition: form-data; name="${name}"\r\n\r\n${value}\r\n`);
const END = Buffer.from(`--${BOUNDARY}--\r\n`);

async function post(...parts: Uint8Array[]): Promise<{ status: number; body: Record<string, unknown> }> {
  const response = await fetch(`http://127.0.0.1:${port}/`, {
    method: 'POST',
    headers: { 'content-type': `multipart/form-data; boundary=${BOUNDARY}` },
    body: new Uint8Array(Buffer.concat(parts)),
  });
  return { status: response.status, body: (await response.json()) as Record<string, unknown> };
}

/** Sends a request's bytes as they are and then cuts the connection. */
async function postAndCut(body: Uint8Array, declaredBytes: number): Promise<void> {
  const socket: Socket = connect(port, '127.0.0.1');
  await new Promise((resolve) => socket.once('connect', resolve));
  const head = `POST / HTTP/1.1\r\nHost: x\r\nContent-Type: multipart/form-data; boundary=${BOUNDARY}\r\nContent-Length: ${declaredBytes}\r\n\r\n`;
  await new Promise<void>((resolve) => socket.write(Buffer.concat([Buffer.from(head), body]), () => resolve()));
  await new Promise((resolve) => setTimeout(resolve, 15));
  socket.destroy();
}

describe('a file that arrives whole', () => {
  it('lies on disk with its sum, its size, a cleaned name and the fields', async () => {
    keepFiles = true;
    const content = randomBytes(150_000);
    const { status, body } = await post(
      fieldPart('caption', 'the bore, eased'),
      filePart('../Länge\u202Egnp.exe', content),
      END,
    );
    expect(status).toBe(200);
    expect(body).toMatchObject({
      name: 'Längegnp.exe',
      byteSize: 150_000,
      sha256: createHash('sha256').update(content).digest('hex'),
      fields: { caption: 'the bore, eased' },
    });
    const file = received!.file;
    expect((await readFile(file.path)).equals(content)).toBe(true);
    expect(file.path.startsWith(incomingFolder(uploadsDir))).toBe(true);
    expect(file.path).not.toContain('exe');
    await file.discard();
    await file.discard();
    await expect(access(file.path)).rejects.toThrow();
  });

  it('may have exactly the size allowed, and may be empty', async () => {
    expect((await post(filePart('a', Buffer.alloc(MAX_BYTES, 1)), END)).body).toMatchObject({ byteSize: MAX_BYTES });
    expect((await post(filePart('a', Buffer.alloc(0)), END)).body).toMatchObject({ byteSize: 0 });
  });

  it('takes fields named after parts of an object as plain names', async () => {
    const { status } = await post(
      fieldPart('__proto__', 'x'),
      fieldPart('constructor', 'y'),
      filePart('a.png', Buffer.from('x')),
      END,
    );
    expect(status).toBe(200);
    expect(({} as Record<string, unknown>)['x']).toBeUndefined();
    expect(Object.getPrototypeOf(received!.fields)).toBe(Object.prototype);
  });
});

describe('what is refused leaves nothing behind', () => {
  const content = Buffer.alloc(100_000, 1);
  it.each<[string, string, () => Uint8Array[]]>([
    ['one byte too many', 'too-large', () => [filePart('a.png', Buffer.alloc(MAX_BYTES + 1)), END]],
    ['a second file', 'too-many', () => [filePart('a.png', content), filePart('b.png', content), END]],
    ['a file in another field', 'too-many', () => [filePart('a.png', content, 'other'), END]],
    ['no file', 'upload-broken', () => [fieldPart('caption', 'x'), END]],
    ['an empty form', 'upload-broken', () => [END]],
    [
      'thirteen fields',
      'form-too-large',
      () => [filePart('a.png', content), ...Array.from({ length: 13 }, (_, at) => fieldPart(`f${at}`, 'x')), END],
    ],
    [
      '10,000 parts',
      'form-too-large',
      () => [filePart('a.png', content), ...Array.from({ length: 10_000 }, () => fieldPart('f', 'x')), END],
    ],
    [
      'a field of 9 KB',
      'form-too-large',
      () => [filePart('a.png', content), fieldPart('caption', 'x'.repeat(9000)), END],
    ],
    [
      'a field name of 5 KB',
      'form-too-large',
      () => [filePart('a.png', content), fieldPart('n'.repeat(5000), 'x'), END],
    ],
    ['deep nesting', 'form-too-large', () => [filePart('a.png', content), fieldPart(`a${'[b]'.repeat(15)}`, 'x'), END]],
    ['any nesting', 'form-too-large', () => [filePart('a.png', content), fieldPart('a[b]', 'x'), END]],
    ['an end that never comes', 'upload-broken', () => [filePart('a.png', content)]],
    ['another boundary', 'upload-broken', () => [Buffer.from('--other\r\n\r\nx\r\n--other--\r\n')]],
  ])('%s', async (_case, code, parts) => {
    const { status, body } = await post(...parts());
    expect([status, body['code']]).toEqual([422, code]);
    expect(body['words']).toMatch(/kept/);
    await vi.waitFor(async () => expect(await leftovers()).toEqual([]));
  });

  it('a form that is not multipart', async () => {
    const response = await fetch(`http://127.0.0.1:${port}/`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: '{}',
    });
    expect(response.status).toBe(422);
    const noBoundary = await fetch(`http://127.0.0.1:${port}/`, {
      method: 'POST',
      headers: { 'content-type': 'multipart/form-data' },
      body: 'x',
    });
    expect(noBoundary.status).toBe(422);
  });

  it('an upload that its sender breaks off, at each tenth', async () => {
    const whole = Buffer.concat([fieldPart('caption', 'x'), filePart('a.png', Buffer.alloc(200_000, 1)), END]);
    for (let tenth = 0; tenth < 10; tenth += 1)
      await postAndCut(whole.subarray(0, Math.floor((whole.length * tenth) / 10)), whole.length);
    await vi.waitFor(() => expect(failures).toHaveLength(10), { timeout: 3000 });
    expect(failures.map((failure) => (failure as FileRefusedError).code)).toEqual(Array(10).fill('upload-broken'));
    await vi.waitFor(async () => expect(await leftovers()).toEqual([]));
    expect(received).toBeUndefined();
  });

  it('an upload that is complete but for its declared length', async () => {
    const whole = Buffer.concat([filePart('a.png', Buffer.alloc(50_000, 1)), END]);
    await postAndCut(whole, whole.length + 1000);
    await vi.waitFor(async () => expect(await leftovers()).toEqual([]));
    expect((await post(filePart('a.png', Buffer.from('x')), END)).status).toBe(200);
  });
});
