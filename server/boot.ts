import type { Server as HttpServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { buildApp, type BuiltApp } from './app.ts';
import type { Env } from './config/env.ts';
import { createDataSource } from './db/data-source.ts';
import { runMigrations } from './db/migrate.ts';
import { forgetOldKeys } from './http/idempotency.ts';
import { createLimits } from './http/limits.ts';
import { createSessionMiddleware } from './http/middleware/session.ts';
import { createMailer } from './integrations/mail/create-mailer.ts';
import { createStorage } from './integrations/storage/create-storage.ts';
import { createLogger, type Logger } from './logging/logger.ts';
import { sendLetter } from './outbox/handlers/send-letter.ts';
import { forgetSentMessages, OutboxRelay } from './outbox/relay.ts';
import { Hub } from './realtime/hub.ts';
import type { Services } from './services.ts';

export interface RunningProcess {
  readonly log: Logger;
  readonly services: Services;
  readonly built: BuiltApp;
  readonly hub: Hub;
  readonly relay: OutboxRelay;
  readonly port: number;
  /** Readiness off, no new connections, requests under way finished, sockets closed, outbox flushed, database let go. */
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
    wakeRelay: () => relay.wake(),
    endConnections: (accountId) => hub.disconnectAccount(accountId),
  };
  const session = createSessionMiddleware(db, env);
  const built = buildApp(services, session.middleware);
  http.on('request', built.app);
  const hub = new Hub(http, services, session.middleware);
  const relay = new OutboxRelay(db, log, {
    event: hub.sendEvent,
    mail: (message) => sendLetter(mailer, env, message),
  });
  relay.start();
  const sweep = setInterval(() => {
    Promise.all([forgetOldKeys(db.manager), forgetSentMessages(db)]).catch((error: unknown) =>
      log.warn({ err: error }, 'sweep failed'),
    );
  }, HOUR_MS);
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
    relay,
    port,
    async stop() {
      built.setReady(false);
      clearInterval(sweep);
      const closed = new Promise<void>((resolve) => http.close(() => resolve()));
      await hub.close();
      http.closeIdleConnections();
      const cut = setTimeout(() => http.closeAllConnections(), DRAIN_MS);
      await closed;
      clearTimeout(cut);
      await relay.stop();
      session.close();
      await services.limits.close();
      await db.destroy();
    },
  };
}
