import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import compression from 'compression';
import express, { type Express, type RequestHandler } from 'express';
import { pinoHttp } from 'pino-http';
import { API_BASE } from '../shared/contracts/route.ts';
import { Api } from './http/api.ts';
import { nothingHere, problemHandler } from './http/middleware/problem-handler.ts';
import { sameOrigin } from './http/middleware/same-origin.ts';
import { securityHeaders } from './http/middleware/security-headers.ts';
import { openApiDocument } from './http/open-api.ts';
import { mountAll } from './routes/all.ts';
import type { Services } from './services.ts';

export interface BuiltApp {
  app: Express;
  api: Api;
  /** Readiness: switched off first when the process stops. */
  setReady(ready: boolean): void;
}

/** Builds the application without listening. */
export function buildApp(services: Services, session: RequestHandler): BuiltApp {
  const { env, log, db } = services;
  let ready = true;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', env.TRUST_PROXY);
  app.set('query parser', 'simple');
  app.get('/healthz', (_req, res) => void res.json({ status: 'alive' }));
  app.get('/readyz', async (_req, res) => {
    const reachable =
      ready &&
      (await db.query('SELECT 1').then(
        () => true,
        () => false,
      ));
    res.status(reachable ? 200 : 503).json({ status: reachable ? 'ready' : 'not ready' });
  });
  app.use(
    pinoHttp({
      logger: log,
      genReqId: (_req, res) => {
        const id = randomUUID();
        res.setHeader('x-request-id', id);
        return id;
      },
      customLogLevel: (_req, res) => (res.statusCode >= 500 ? 'error' : 'debug'),
    }),
  );
  app.use(securityHeaders(env.PUBLIC_ORIGIN));

  const api = new Api(services);
  mountAll(api);
  app.use(
    API_BASE,
    noStore,
    compression({ threshold: 2048 }),
    sameOrigin(env.PUBLIC_ORIGIN),
    express.json({ limit: '256kb' }),
  );
  app.get(`${API_BASE}/openapi.json`, (_req, res) => void res.json(openApiDocument()));
  app.use(API_BASE, session, api.router, nothingHere);

  if (env.WEB_DIR) serveClient(app, env.WEB_DIR);
  app.use(nothingHere, problemHandler(log));
  return { app, api, setReady: (now) => void (ready = now) };
}

const noStore: RequestHandler = (_req, res, next) => {
  res.setHeader('cache-control', 'private, no-store');
  next();
};

/** Built files carry a hash in their name and are kept for good; the page itself is asked for each time. */
function serveClient(app: Express, webDir: string): void {
  app.use(compression());
  app.use(
    '/assets',
    express.static(join(webDir, 'assets'), { index: false, immutable: true, maxAge: '365d', fallthrough: false }),
  );
  app.use(express.static(webDir, { index: false, maxAge: '1h' }));
  app.get('/{*path}', (req, res, next) => {
    if (req.path.startsWith('/api/') || req.path.startsWith('/socket.io/')) return next();
    res.setHeader('cache-control', 'no-cache');
    res.sendFile('index.html', { root: webDir });
  });
}
