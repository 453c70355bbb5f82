import type { Server as HttpServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { buildApp, type BuiltApp } from './app.ts';
import type { Env } from './config/env.ts';
import { createDataSource } from './db/data-source.ts';
import { runMigrations } from './db/migrate.ts';
import { createLimits } from './http/limits.ts';
import { createSessionMiddleware } from './http/middleware/session.ts';
import { createMailer } from './integrations/mail/create-mailer.ts';
import { createStorage } from './integrations/storage/create-storage.ts';
import { createLogger, type Logger } from './logging/logger.ts';
import { sendLetter } from './outbox/handlers/send-letter.ts';
import { OutboxRelay } from './outbox/relay.ts';
import { Hub } from './realtime/hub.ts';
import type { Services } from './services.ts';
import { sweep } from './sweep.ts';

export interface RunningProcess {
  readonly log: Logger;
  readonly services: Services;
  readonly built: BuiltApp;
  readonly hub: Hub;
  readonly relays: readonly OutboxRelay[];
  readonly port: number;
  /** Readiness off, no new connections, requests under way finished, sockets closed, what is being sent sent, database let go. Letters still in the outbox go out at the next start. */
  stop(): Promise<void>;
}

const HOUR_MS = 60 * 60 * 1000;
/** Requests under way get this long before their connections are cut. */
const DRAIN_MS = 8000;

/** Starts everything in the order it depends on each other, and stops it in the reverse one. */
export async function startProcess(
  env: Env,
  http: HttpServer,
  clock: () => Date = () => new Date(),
): Promise<RunningProcess> {
  const log = createLogger(env.LOG_LEVEL);
  if (env.MIGRATE) await runMigrations(env.DATABASE_URL);
  const db = createDataSource(env.DATABASE_URL, env.DATABASE_POOL_SIZE);
  await db.initialize();
  const mailer = createMailer(env);
  const services: Services = {
    env,
    db,
    log,
    storage: createStorage(env),
    limits: createLimits(env.DATABASE_URL, env.RELAXED_LIMITS ? 1000 : 1),
    clock,
    wakeRelay: () => relays.forEach((relay) => relay.wake()),
    endConnections: (accountId) => hub.disconnectAccount(accountId),
  };
  const session = createSessionMiddleware(db, env);
  const built = buildApp(services, session.middleware);
  http.on('request', built.app);
  const hub = new Hub(http, services, session.middleware);
  const relays = [
    new OutboxRelay(db, log, 'event', hub.sendEvent),
    new OutboxRelay(db, log, 'mail', (message) => sendLetter(mailer, env, message)),
  ];
  for (const relay of relays) relay.start();
  const sweepNow = (): void =>
    void sweep(db, env, clock()).catch((error: unknown) => log.warn({ err: error }, 'sweep failed'));
  sweepNow();
  const sweepTimer = setInterval(sweepNow, HOUR_MS);
  await new Promise<void>((resolve, reject) => {
    http.once('error', reject);
    http.listen(env.PORT, env.HOST, resolve);
  });
  const { port } = http.address() as AddressInfo;
  log.info({ port }, 'listening');

  return {
    log,
    services,
    built,
    hub,
    relays,
    port,
    async stop() {
      built.setReady(false);
      clearInterval(sweepTimer);
      const closed = new Promise<void>((resolve) => http.close(() => resolve()));
      // Before the sockets are closed: that waits for requests under way too, and one of them may never end.
      const cut = setTimeout(() => http.closeAllConnections(), DRAIN_MS);
      http.closeIdleConnections();
      await hub.close();
      await closed;
      clearTimeout(cut);
      await Promise.all(relays.map((relay) => relay.stop()));
      session.close();
      await services.limits.close();
      await db.destroy();
    },
  };
}
