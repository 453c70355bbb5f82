import { randomUUID } from 'node:crypto';
import { mkdtemp, mkdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as legs from '../../shared/contracts/parts-and-legs.ts';
import { API_BASE } from '../../shared/contracts/route.ts';
import { openThread } from '../../shared/contracts/threads.ts';
import { problemSchema, type Problem } from '../../shared/problems/problems.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
let kit: CommissionKit;
let threadId: string;
let hiltId: string;
let webDir: string;

beforeAll(async () => {
  webDir = await mkdtemp(join(tmpdir(), 'ferrule-web-'));
  await mkdir(join(webDir, 'assets'));
  await writeFile(join(webDir, 'index.html'), '<!doctype html>');
  app = await startTestApp({ WEB_DIR: webDir });
  kit = await makeCommissionKit(app);
  const params = { commissionId: kit.commissionId };
  threadId = (
    await kit.lead.client.call(openThread, {
      params,
      body: { subject: 'commission', subjectId: kit.commissionId, title: 'Odd', audience: 'everyone', partyIds: [] },
    })
  ).id;
  hiltId = (
    await kit.lead.client.call(legs.createPart, {
      params,
      body: { name: 'Hilt', kind: 'hilt', holderPartyId: kit.lead.partyId },
    })
  ).id;
});
afterAll(async () => {
  await app.close();
  await rm(webDir, { recursive: true, force: true });
});

/** A request below what the test client lets through. @returns status and problem of the refusal */
async function refusal(
  method: string,
  path: string,
  body?: string,
  headers: Readonly<Record<string, string>> = {},
): Promise<Problem> {
  const response = await fetch(`http://127.0.0.1:${app.port}${path}`, {
    method,
    headers: {
      origin: app.origin,
      cookie: kit.lead.client.cookie,
      'idempotency-key': randomUUID(),
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      ...headers,
    },
    ...(body === undefined ? {} : { body }),
  });
  expect(response.headers.get('content-type')).toContain('application/problem+json');
  return problemSchema.parse(await response.json());
}

const leg = (changes: Record<string, unknown>): string =>
  JSON.stringify({
    partyId: kit.lead.partyId,
    partId: hiltId,
    kind: 'wiring',
    title: 'Wire',
    hopefulDays: 1,
    likelyDays: 2,
    badDays: 3,
    plannedStartOn: null,
    afterLegIds: [],
    ...changes,
  });
const legsPath = (): string => `${API_BASE}/commissions/${kit.commissionId}/legs`;
const errorsOf = (problem: Problem): string[] => (problem.errors ?? []).map((error) => error.pointer);

describe('input that no form sends', () => {
  it.each([
    ['a null character', 'a\u0000b'],
    ['half of a surrogate pair', 'a\ud800b'],
  ])('%s is refused by the name of its field', async (_what, title) => {
    expect(errorsOf(await refusal('POST', legsPath(), leg({ title })))).toEqual(['/body/title']);
    const message = JSON.stringify({ id: randomUUID(), body: title, mentionedAccountIds: [], fileIds: [] });
    const path = `${API_BASE}/commissions/${kit.commissionId}/threads/${threadId}/messages`;
    expect(errorsOf(await refusal('POST', path, message))).toEqual(['/body/body']);
  });

  it('a null character is refused in a search and at the sign-in', async () => {
    expect(errorsOf(await refusal('GET', `${API_BASE}/commissions?search=a%00b`))).toEqual(['/query/search']);
    const door = JSON.stringify({ email: 'a\u0000@b.test', password: 'x'.repeat(20) });
    expect(errorsOf(await refusal('POST', `${API_BASE}/session`, door))).toContain('/body/email');
  });

  it.each(['0000-01-01', '0001-01-01', '9999-12-31'])('a year like that of %s is a slip of the key', async (day) => {
    expect(errorsOf(await refusal('POST', legsPath(), leg({ plannedStartOn: day })))).toEqual(['/body/plannedStartOn']);
  });

  it('a page mark that was made up reaches no statement', async () => {
    for (const values of [['x', 'y'], ['2026-12-01 10:00:00+00', 'y'], ['2026-12-01'], 7, null]) {
      const cursor = Buffer.from(JSON.stringify(values)).toString('base64url');
      expect(errorsOf(await refusal('GET', `${API_BASE}/commissions?cursor=${cursor}`))).toEqual(['/query/cursor']);
    }
  });

  it('a sequence beyond any there can be is refused', async () => {
    const path = `${API_BASE}/commissions/${kit.commissionId}/threads/${threadId}/messages?before=99999999999`;
    expect(errorsOf(await refusal('GET', path))).toEqual(['/query/before']);
  });

  it('a body in another encoding, or an address that is none, is the sender’s fault and not ours', async () => {
    const odd = { 'content-type': 'application/json; charset=latin9' };
    expect((await refusal('POST', `${API_BASE}/session`, '{}', odd)).status).toBe(400);
    expect((await refusal('POST', `${API_BASE}/session`, '{}', { 'content-encoding': 'zstd' })).status).toBe(400);
    expect((await refusal('GET', '/%E0%A4%A')).status).toBe(400);
  });

  it('a built file of an earlier build is not there, and that is all', async () => {
    expect((await refusal('GET', '/assets/old-chunk.js')).status).toBe(404);
  });

  it('the same upload twice at the same moment is one file', async () => {
    const id = randomUUID();
    const upload = async (): Promise<number> => {
      const form = new FormData();
      for (const [name, value] of Object.entries({ id, place: 'thread', placeId: threadId, purpose: 'message' }))
        form.set(name, value);
      form.set('file', new Blob(['channel 3 to ground\n'.repeat(500)]), 'notes.txt');
      const response = await fetch(`http://127.0.0.1:${app.port}${API_BASE}/commissions/${kit.commissionId}/files`, {
        method: 'POST',
        body: form,
        headers: { origin: app.origin, cookie: kit.lead.client.cookie, 'x-ferrule': '1' },
      });
      return response.status;
    };
    expect(await Promise.all([upload(), upload()])).toEqual([201, 201]);
  });

  it('a leg cannot be said to have begun on a day to come', async () => {
    const params = { commissionId: kit.commissionId };
    const made = await kit.lead.client.call(legs.createLeg, { params, body: JSON.parse(leg({})) as never });
    const later = { revision: made.revision, state: 'under-way', onDay: '2099-01-01' } as const;
    const refused = await kit.lead.client.refused(legs.moveLeg, {
      params: { ...params, legId: made.id },
      body: later,
    });
    expect(errorsOf(refused)).toEqual(['/body/onDay']);
  });
});
