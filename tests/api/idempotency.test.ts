import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ALL_ROUTES } from '../../shared/contracts/all-routes.ts';
import { createPart, listParts } from '../../shared/contracts/parts-and-legs.ts';
import { BODIES } from '../support/authorization-requests.ts';
import type { Target } from '../support/authorization-world.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
let kit: CommissionKit;
let params: { commissionId: string };
beforeAll(async () => {
  app = await startTestApp();
  kit = await makeCommissionKit(app);
  params = { commissionId: kit.commissionId };
});
afterAll(() => app.close());

const part = (name: string) => ({ name, kind: 'other' as const, holderPartyId: kit.lead.partyId });
const add = (key: string, name: string, who: 'lead' | 'maker' = 'lead') =>
  kit[who].client.try(createPart, { params, body: part(name) }, { 'idempotency-key': key });
const named = async (name: string): Promise<number> =>
  (await kit.lead.client.call(listParts, { params })).filter((one) => one.name === name).length;
const codeOf = (outcome: Awaited<ReturnType<typeof add>>): string => (outcome.ok ? 'done' : outcome.problem.code);

const KEYED = ALL_ROUTES.filter(({ route }) => route.keyed);

describe('every route that makes something', () => {
  it('is among these', () => {
    expect(KEYED.map(({ name }) => name).sort()).toEqual([
      'addReadings',
      'answerFitReport',
      'createCommission',
      'createHandoff',
      'createJoint',
      'createLeg',
      'createPart',
      'createShop',
      'inviteParty',
      'inviteShopMember',
      'offerHandoffDay',
      'openThread',
      'raiseFitReport',
    ]);
  });

  it.each(KEYED)('$name asks for a key', async ({ name, route }) => {
    // Ids that are nowhere: a request without a key is not even looked at.
    const anywhere = new Proxy({} as Target, { get: () => randomUUID() });
    for (const key of ['', 'short', 'x'.repeat(300)]) {
      const outcome = await kit.lead.client.try(
        route,
        {
          params: new Proxy({}, { get: () => randomUUID() }),
          body: BODIES[name]?.(anywhere),
        },
        { 'idempotency-key': key },
      );
      expect([name, key.length, outcome.ok ? 'done' : outcome.problem.code]).toEqual([
        name,
        key.length,
        'idempotency-key-missing',
      ]);
    }
  });
});

describe('under one key', () => {
  it('a request sent again gets the first answer, though the record has changed since', async () => {
    const key = randomUUID();
    const first = await add(key, 'Emitter');
    await app.services.db.query(`UPDATE "part" SET "name" = 'Renamed' WHERE "name" = 'Emitter'`);
    expect(await add(key, 'Emitter')).toEqual(first);
    expect([await named('Emitter'), await named('Renamed')]).toEqual([0, 1]);
  });

  it('another body is refused, and so is the same body to another place', async () => {
    const key = randomUUID();
    await add(key, 'Grip');
    expect(codeOf(await add(key, 'Grip, long'))).toBe('idempotency-key-reused');
    const other = await makeCommissionKit(app);
    const elsewhere = await kit.lead.client.try(
      createPart,
      { params: { commissionId: other.commissionId }, body: part('Grip') },
      { 'idempotency-key': key },
    );
    expect(codeOf(elsewhere)).toBe('idempotency-key-reused');
    expect(await named('Grip')).toBe(1);
  });

  it('eight at the same moment make one, and all get its answer', async () => {
    const key = randomUUID();
    const outcomes = await Promise.all(Array.from({ length: 8 }, () => add(key, 'Switch')));
    expect(outcomes.map(codeOf)).toEqual(Array.from({ length: 8 }, () => 'done'));
    expect(new Set(outcomes.map((outcome) => (outcome.ok ? outcome.body.id : ''))).size).toBe(1);
    expect(await named('Switch')).toBe(1);
  });

  it('a first try that was refused leaves nothing and the key usable, also with other values', async () => {
    const key = randomUUID();
    const refused = await kit.lead.client.try(
      createPart,
      { params, body: { ...part('Blade'), holderPartyId: randomUUID() } },
      { 'idempotency-key': key },
    );
    expect([codeOf(refused), await named('Blade')]).toEqual(['input-invalid', 0]);
    expect(codeOf(await add(key, 'Blade'))).toBe('done');
  });

  it('a try that waits for one that is refused goes on by itself', async () => {
    const key = randomUUID();
    const [refused, done] = await Promise.all([
      kit.lead.client.try(
        createPart,
        { params, body: { ...part('Cap'), holderPartyId: randomUUID() } },
        { 'idempotency-key': key },
      ),
      add(key, 'Cap'),
    ]);
    // Whichever came first: the sound one is done once, the other is refused for its values or for the key.
    expect(codeOf(done)).toBe('done');
    expect(['input-invalid', 'idempotency-key-reused']).toContain(codeOf(refused));
    expect(await named('Cap')).toBe(1);
  });

  it('two people do not meet: a key is each one’s own', async () => {
    const key = randomUUID();
    await add(key, 'Pommel');
    // The maker may not add parts: a key of the lead's opens nothing and shows nothing.
    expect(codeOf(await add(key, 'Pommel', 'maker'))).toBe('not-permitted');
    expect(await named('Pommel')).toBe(1);
  });

  it('an answer is given again only to someone who is signed in', async () => {
    const other = await makeCommissionKit(app);
    const key = randomUUID();
    const ask = () =>
      other.lead.client.try(
        createPart,
        {
          params: { commissionId: other.commissionId },
          body: { ...part('Plug'), holderPartyId: other.lead.partyId },
        },
        { 'idempotency-key': key },
      );
    expect(codeOf(await ask())).toBe('done');
    await app.services.db.query('DELETE FROM "web_session" WHERE true');
    expect(codeOf(await ask())).toBe('not-signed-in');
  });
});
