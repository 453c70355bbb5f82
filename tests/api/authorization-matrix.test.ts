import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ALL_ROUTES, type NamedRoute } from '../../shared/contracts/all-routes.ts';
import { API_BASE } from '../../shared/contracts/route.ts';
import { putConsumables, USES_UP } from '../support/authorization-consumables.ts';
import { BODIES, QUERIES, uploadFields } from '../support/authorization-requests.ts';
import { OUTCOMES } from '../support/authorization-table.ts';
import {
  makeAuthorizationWorld,
  ROLES,
  TARGETS,
  type AuthorizationWorld,
  type RoleName,
  type Target,
} from '../support/authorization-world.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import type { TestClient } from '../support/test-client.ts';

let app: TestApp;
let world: AuthorizationWorld;

beforeAll(async () => {
  app = await startTestApp();
  world = await makeAuthorizationWorld(app);
}, 60_000);
afterAll(() => app.close());

const LETTERS: Readonly<Record<number, string>> = { 401: '-', 403: 'N', 404: '0' };
/** Answers that only one who may act is given. */
const ALLOWED = new Set([200, 201, 202, 204, 206, 409, 410, 422]);

const letterOf = (status: number): string => LETTERS[status] ?? (ALLOWED.has(status) ? 'Y' : `?${status}`);

/** One request as a browser of the role sends it. */
async function ask({ name, route }: NamedRoute, client: TestClient, target: Target): Promise<number> {
  // The shop's own invitation hangs on the same parameter name as the commission's.
  const ids: Record<string, string> = {
    ...target,
    ...(name === 'withdrawShopInvitation' ? { invitationId: target.shopInvitationId } : {}),
  };
  const path = route.path.replace(/:(\w+)/g, (_whole, id: string) => ids[id] ?? randomUUID());
  const query = new URLSearchParams(QUERIES[name]?.(target) ?? {});
  const headers = {
    origin: app.origin,
    cookie: client.cookie,
    ...(route.keyed ? { 'idempotency-key': randomUUID() } : {}),
  };
  const url = `${client.baseUrl}${API_BASE}${path}${query.size > 0 ? `?${query.toString()}` : ''}`;
  if (route.multipart) {
    const form = new FormData();
    for (const [field, value] of Object.entries(uploadFields(target))) form.append(field, value);
    form.append('file', new Blob(['hello']), 'note.txt');
    return (await fetch(url, { method: 'POST', headers: { ...headers, 'x-ferrule': '1' }, body: form })).status;
  }
  const response = await fetch(url, {
    method: route.method,
    headers: { ...headers, 'content-type': 'application/json' },
    ...(route.method === 'GET' ? {} : { body: JSON.stringify(BODIES[name]?.(target) ?? {}) }),
  });
  await response.arrayBuffer();
  return response.status;
}

/** Acts that end the session they are done with. */
const ENDS_SESSION = new Set(['signOut', 'signOutEverywhere']);

async function rowOf(route: NamedRoute, targetName: (typeof TARGETS)[number]): Promise<string> {
  const letters: string[] = [];
  for (const role of ROLES) {
    const client = ENDS_SESSION.has(route.name) ? await world.freshClient(role) : world.clients[role];
    const target = world.targets[targetName];
    if (USES_UP.has(route.name) && targetName !== 'missing') await putConsumables(app, target);
    letters.push(letterOf(await ask(route, client, target)));
  }
  return letters.join('');
}

it('every route has a row in the table, and every row a route', () => {
  expect(Object.keys(OUTCOMES).sort()).toEqual(ALL_ROUTES.map((route) => route.name).sort());
  for (const [name, rows] of Object.entries(OUTCOMES))
    for (const row of Object.values(rows) as string[]) expect([name, row.length]).toEqual([name, ROLES.length]);
});

it('every unsafe route that takes values has a valid body here, so that a refusal is one of rights', () => {
  for (const { name, route } of ALL_ROUTES) {
    const body = BODIES[name]?.(world.targets.own) ?? {};
    if (!route.multipart) expect([name, route.body.safeParse(body).success]).toEqual([name, true]);
  }
});

// The sign-outs come last: they end every session of their person.
const inOrder = [...ALL_ROUTES].sort(
  (one, other) => Number(ENDS_SESSION.has(one.name)) - Number(ENDS_SESSION.has(other.name)),
);

describe.each(inOrder)('$name', (route) => {
  it('answers each role for own, other, foreign and missing as the table says', async () => {
    const expected = OUTCOMES[route.name];
    const found: Record<string, string> = {};
    for (const target of TARGETS) found[target] = await rowOf(route, target);
    expect(found).toEqual(expected);
  });
});

it('roles in the table are those of the world', () => {
  const named: readonly RoleName[] = Object.keys(world.clients) as RoleName[];
  expect([...named].sort()).toEqual([...ROLES].sort());
});
