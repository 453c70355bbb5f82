import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { createServer } from 'node:net';
import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Socket } from 'socket.io-client';
import { API_BASE } from '../../shared/contracts/route.ts';
import { createThreadFollower } from '../../shared/realtime/thread-follower.ts';
import { makeCommissionKit, makeThread, type CommissionKit } from '../support/commission-kit.ts';
import { openSocket } from '../support/socket-client.ts';
import { TcpProxy } from '../support/tcp-proxy.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

const MESSAGES = 60;
const WRITERS = ['lead', 'maker'] as const;
const FAULTS = 6;

/** A small generator with a seed (Mulberry32), so that a run that failed can be had again. */
function randomFrom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

const freePort = (): Promise<number> =>
  new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0));
    });
  });

let app: TestApp;
let kit: CommissionKit;
let threadId: string;
let serverPort: number;
let server: ChildProcess | undefined;
let proxy: TcpProxy;
let proxyPort: number;

/** The real server in a process of its own, on the same database and secrets as the application that made the people. */
async function startServer(): Promise<void> {
  server = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], {
    stdio: 'ignore',
    env: {
      ...process.env,
      TSX_TSCONFIG_PATH: 'server/tsconfig.json',
      NODE_ENV: 'test',
      DATABASE_URL: app.databaseUrl,
      DATABASE_POOL_SIZE: '4',
      HOST: '127.0.0.1',
      PORT: String(serverPort),
      PUBLIC_ORIGIN: app.origin,
      SESSION_SECRET: app.services.env.SESSION_SECRET,
      FIELD_KEY: app.services.env.FIELD_KEY,
      UPLOADS_DIR: app.services.env.UPLOADS_DIR,
      RELAXED_LIMITS: '1',
      LOG_LEVEL: 'silent',
    },
  });
  for (;;) {
    const ready = await fetch(`http://127.0.0.1:${serverPort}/readyz`).then(
      (response) => response.ok,
      () => false,
    );
    if (ready) return;
    await pause(100);
  }
}

const kill = (): Promise<void> =>
  new Promise((resolve) => {
    if (!server) return resolve();
    server.once('exit', () => resolve());
    server.kill('SIGKILL');
  });

beforeAll(async () => {
  app = await startTestApp();
  kit = await makeCommissionKit(app);
  threadId = await makeThread(app, kit, 'makers');
  // Only the process that is killed may send events here.
  await app.stopRelays();
  serverPort = await freePort();
  proxy = new TcpProxy(serverPort);
  proxyPort = await proxy.listen();
  await startServer();
}, 60_000);

afterAll(async () => {
  await kill();
  await proxy.close();
  await app.close();
});

const address = (): string =>
  `http://127.0.0.1:${proxyPort}${API_BASE}/commissions/${kit.commissionId}/threads/${threadId}/messages`;

/** Sends one message again and again under one id until the server says it has it. */
async function sendUntilAcknowledged(cookie: string, id: string, body: string): Promise<number> {
  for (let tries = 1; ; tries += 1) {
    const response = await fetch(address(), {
      method: 'POST',
      headers: { origin: app.origin, cookie, 'content-type': 'application/json' },
      body: JSON.stringify({ id, body }),
      signal: AbortSignal.timeout(3000),
    }).catch(() => null);
    if (response?.status === 201) return tries;
    if (response && response.status < 500) throw new Error(`${response.status} ${await response.text()}`);
    await pause(60);
  }
}

/** Follows the thread as a browser does: events only say "look", every connect asks for what was missed. */
function follow(cookie: string): { socket: Socket; seen: { sequence: number; id: string }[]; poke: () => void } {
  const seen: { sequence: number; id: string }[] = [];
  const follower = createThreadFollower<{ sequence: number; id: string }>({
    lastSequence: 0,
    fetchAfter: async (after) => {
      const response = await fetch(`${address()}?after=${after}&limit=7`, {
        headers: { cookie },
        signal: AbortSignal.timeout(3000),
      });
      if (!response.ok) throw new Error(String(response.status));
      return ((await response.json()) as { messages: { sequence: number; id: string }[] }).messages;
    },
    onMessages: (messages) => seen.push(...messages),
  });
  const socket = openSocket({ cookie }, proxyPort, app.origin);
  socket.on('connect', () => follower.poke());
  socket.on('thread.message-added', () => follower.poke());
  return { socket, seen, poke: () => follower.poke() };
}

it('connections cut and the server killed at random moments: every message once, in one order, to every reader', async () => {
  const seed = Number(process.env['FAULT_SEED'] ?? 20261201);
  const random = randomFrom(seed);
  const readers = [follow(kit.finisher.client.cookie), follow(kit.maker.client.cookie)];
  const sent: string[] = [];
  let writing = true;
  const writers = WRITERS.map(async (who) => {
    for (let count = 0; count < MESSAGES / WRITERS.length; count += 1) {
      const id = randomUUID();
      sent.push(id);
      await sendUntilAcknowledged(kit[who].client.cookie, id, `${who} ${count}`);
    }
  });
  const faults = (async () => {
    for (let fault = 0; fault < FAULTS && writing; fault += 1) {
      await pause(150 + random() * 500);
      proxy.delayMs = Math.floor(random() * 30);
      if (fault % 3 === 1) {
        await kill();
        await startServer();
      } else proxy.cut();
    }
  })();
  await Promise.all(writers);
  writing = false;
  await faults;
  proxy.delayMs = 0;

  // A reader hears of the last messages by an event of the outbox or at its next connect; nothing else is asked of it.
  await expect
    .poll(() => readers.map((reader) => reader.seen.length), { timeout: 20_000 })
    .toEqual([MESSAGES, MESSAGES]);
  const stored = await app.services.db.manager.query<{ sequence: number; id: string }[]>(
    'SELECT "sequence", "id" FROM "message" WHERE "thread_id" = $1 ORDER BY "sequence"',
    [threadId],
  );
  expect(
    stored.map((row) => row.sequence),
    `seed ${seed}`,
  ).toEqual(Array.from({ length: MESSAGES }, (_one, index) => index + 1));
  expect(stored.map((row) => row.id).sort()).toEqual([...sent].sort());
  for (const reader of readers) {
    expect(reader.seen.map((message) => message.sequence)).toEqual(stored.map((row) => row.sequence));
    expect(reader.seen.map((message) => message.id)).toEqual(stored.map((row) => row.id));
    reader.socket.disconnect();
  }
}, 110_000);
