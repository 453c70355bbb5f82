import { createServer } from 'node:http';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { inject } from 'vitest';
import { startProcess, type RunningProcess } from '../../server/boot.ts';
import { readEnv } from '../../server/config/env.ts';
import { createTestDatabase, dropTestDatabase } from './test-database.ts';

export interface TestApp extends RunningProcess {
  readonly origin: string;
  readonly databaseUrl: string;
  readonly mailDir: string;
  /** What `services.clock` answers; tests move it. */
  setNow(now: Date): void;
  /** From then on the outbox is left to the test. */
  stopRelays(): Promise<void>;
  close(): Promise<void>;
}

/** The whole application on a database of its own, listening on a free port of loopback. */
export async function startTestApp(overrides: Record<string, string> = {}): Promise<TestApp> {
  const databaseUrl = await createTestDatabase(inject('adminUrl'));
  const folder = await mkdtemp(join(tmpdir(), 'ferrule-test-files-'));
  const http = createServer();
  let now: Date | null = null;
  const mailDir = join(folder, 'mail');
  // The port is known only after listening, so the origin is fixed by name and every test client sends it.
  const origin = 'http://ferrule.test';
  const env = readEnv({
    NODE_ENV: 'test',
    DATABASE_URL: databaseUrl,
    DATABASE_POOL_SIZE: '6',
    PORT: '0',
    PUBLIC_ORIGIN: origin,
    SESSION_SECRET: 'a secret for tests alone, long enough',
    FIELD_KEY: '0123456789abcdef'.repeat(4),
    UPLOADS_DIR: join(folder, 'uploads'),
    MAIL_DIR: mailDir,
    LOG_LEVEL: process.env['TEST_LOG_LEVEL'] ?? 'silent',
    RELAXED_LIMITS: '1',
    ...overrides,
  });
  const running = await startProcess(env, http, () => now ?? new Date());
  return {
    ...running,
    origin,
    databaseUrl,
    mailDir,
    setNow: (moment) => void (now = moment),
    async stopRelays() {
      await Promise.all(running.relays.map((relay) => relay.stop()));
    },
    async close() {
      await running.stop();
      await dropTestDatabase(inject('adminUrl'), databaseUrl);
      await rm(folder, { recursive: true, force: true });
    },
  };
}
