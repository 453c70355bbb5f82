import { request } from 'node:http';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { ALL_ROUTES } from '../../shared/contracts/all-routes.ts';
import { API_BASE } from '../../shared/contracts/route.ts';
import { EnvInvalid, readEnv } from '../../server/config/env.ts';
import { createDataSource } from '../../server/db/data-source.ts';
import { runMigrations } from '../../server/db/migrate.ts';
import { ALL_MIGRATIONS } from '../../server/db/migrations/all-migrations.ts';
import { makeAccount, signedInAs } from '../factories/account.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { createTestDatabase, dropTestDatabase } from '../support/test-database.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

it('mounts every contract exactly once', () => {
  const key = (route: { method: string; path: string }): string => `${route.method} ${route.path}`;
  expect(app.built.api.mounted.map(key).sort()).toEqual(ALL_ROUTES.map(({ route }) => key(route)).sort());
});

it('migrates an empty database once under two starts at the same moment, to just the schema of the entities', async () => {
  const url = await createTestDatabase(inject('adminUrl'), { template: 'template0' });
  try {
    await Promise.all([runMigrations(url), runMigrations(url)]);
    const db = await createDataSource(url, 2).initialize();
    const done = await db.query<{ count: string }[]>('SELECT count(*) FROM "migrations"');
    const drift = (await db.driver.createSchemaBuilder().log()).upQueries.map((query) => query.query);
    await db.destroy();
    expect(Number(done[0]?.count)).toBe(ALL_MIGRATIONS.length);
    expect(drift).toEqual([]);
  } finally {
    await dropTestDatabase(inject('adminUrl'), url);
  }
});

describe('configuration', () => {
  it('names every variable that is wrong and prints no value', () => {
    const attempt = (): unknown =>
      readEnv({
        DATABASE_URL: 'mysql://secret@host/x',
        SESSION_SECRET: 'short-secret',
        FIELD_KEY: 'zz',
        PUBLIC_ORIGIN: 'nowhere',
        UPLOADS_DIR: '',
      });
    expect(attempt).toThrow(EnvInvalid);
    try {
      attempt();
    } catch (error) {
      const { message } = error as Error;
      for (const name of ['DATABASE_URL', 'SESSION_SECRET', 'FIELD_KEY', 'PUBLIC_ORIGIN', 'UPLOADS_DIR'])
        expect(message).toContain(name);
      for (const value of ['short-secret', 'secret@host', 'nowhere']) expect(message).not.toContain(value);
    }
  });

  it('refuses loosened limits in production', () => {
    expect(() =>
      readEnv({
        ...process.env,
        NODE_ENV: 'production',
        RELAXED_LIMITS: '1',
        DATABASE_URL: 'postgres://x/y',
        SESSION_SECRET: 'x'.repeat(32),
        FIELD_KEY: '0'.repeat(64),
        PUBLIC_ORIGIN: 'http://a.test',
        UPLOADS_DIR: '/x',
      }),
    ).toThrow('RELAXED_LIMITS');
  });
});

it('is alive, is ready, and stops being ready when it is told to stop', async () => {
  const at = (path: string) => fetch(`http://127.0.0.1:${app.port}${path}`);
  expect((await at('/healthz')).status).toBe(200);
  expect((await at('/readyz')).status).toBe(200);
  app.built.setReady(false);
  expect((await at('/readyz')).status).toBe(503);
  expect((await at('/healthz')).status).toBe(200);
  app.built.setReady(true);
});

it('tells its API as OpenAPI 3.1, with every route and its refusals', async () => {
  const document = (await (await fetch(`http://127.0.0.1:${app.port}${API_BASE}/openapi.json`)).json()) as {
    openapi: string;
    paths: Record<string, Record<string, { operationId: string; responses: Record<string, unknown> }>>;
  };
  expect(document.openapi).toBe('3.1.0');
  const operations = Object.values(document.paths).flatMap((methods) => Object.values(methods));
  expect(operations.map((operation) => operation.operationId).sort()).toEqual(
    ALL_ROUTES.map((route) => route.name).sort(),
  );
  for (const operation of operations) expect(Object.keys(operation.responses)).toContain('422');
});

describe('requests that are not from the product itself', () => {
  const send = (headers: Record<string, string>, body = '{}') =>
    fetch(`http://127.0.0.1:${app.port}${API_BASE}/session`, { method: 'POST', headers, body });

  it.each([
    ['another origin', { origin: 'http://elsewhere.test', 'content-type': 'application/json' }, 'origin-refused'],
    ['no origin at all', { 'content-type': 'application/json' }, 'origin-refused'],
    [
      "another site by the browser's own word",
      { 'sec-fetch-site': 'cross-site', 'content-type': 'application/json' },
      'origin-refused',
    ],
    [
      'a plain form',
      { origin: 'http://ferrule.test', 'content-type': 'application/x-www-form-urlencoded' },
      'malformed-request',
    ],
    [
      'multipart without the header that only a script sets',
      { origin: 'http://ferrule.test', 'content-type': 'multipart/form-data; boundary=x' },
      'malformed-request',
    ],
  ])('%s is refused', async (_case, headers, code) => {
    const response = await send(headers);
    // RFC 9457: media type and members of a problem.
    expect(response.headers.get('content-type')).toContain('application/problem+json');
    const problem = (await response.json()) as Record<string, unknown>;
    expect(problem).toMatchObject({ code, status: response.status });
    expect(problem['type']).toMatch(/^tag:/);
    expect(problem['title']).toEqual(expect.any(String));
    expect(problem['instance']).toMatch(/^urn:request:[0-9a-f-]{36}$/);
  });

  it('a body that is not the JSON it says it is gets a problem and no stack', async () => {
    const response = await send({ origin: 'http://ferrule.test', 'content-type': 'application/json' }, '{"email": ');
    expect(response.status).toBe(400);
    expect(await response.text()).not.toContain('at ');
  });
});

it('sends a strict policy with every page, without inline scripts or styles', async () => {
  const policy =
    (await fetch(`http://127.0.0.1:${app.port}/healthz-not-there`)).headers.get('content-security-policy') ?? '';
  expect(policy).toContain("default-src 'none'");
  expect(policy).toContain("script-src 'self'");
  expect(policy).toContain("frame-ancestors 'none'");
  expect(policy).not.toContain('unsafe');
});

it('stops within its patience though a request under way never ends', async () => {
  const other = await startTestApp();
  const client = await signedInAs(other, await makeAccount(other));
  const endless = request({
    host: '127.0.0.1',
    port: other.port,
    path: '/api/v1/me',
    method: 'PATCH',
    headers: {
      origin: other.origin,
      cookie: client.cookie,
      'content-type': 'application/json',
      'content-length': '50',
    },
  });
  const cut = new Promise((resolve) => endless.once('error', resolve));
  endless.write('{');
  await new Promise((resolve) => setTimeout(resolve, 300));
  await other.close();
  expect(await cut).toBeInstanceOf(Error);
}, 20_000);
