import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as contracts from '../../shared/contracts/commissions.ts';
import * as legs from '../../shared/contracts/parts-and-legs.ts';
import { readCode } from '../../shared/engines/codes/crockford.ts';
import { poolOf } from '../../server/db/data-source.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
let kit: CommissionKit;
beforeAll(async () => {
  app = await startTestApp();
  kit = await makeCommissionKit(app);
});
afterAll(() => app.close());

const brief = (title: string) => ({
  leadShopId: kit.lead.shopId ?? '',
  title,
  brief: 'Brass',
  dateWanted: null,
  budgetMinor: 1000,
  currency: 'EUR' as const,
});
const titles = async (): Promise<string[]> =>
  (await kit.lead.client.call(contracts.listCommissions, { query: { limit: 100 } })).items.map((row) => row.title);

describe('opening a commission', () => {
  it('gives it a code that holds, and its opener the lead', async () => {
    const made = await kit.lead.client.call(contracts.createCommission, { body: brief('One') });
    expect(readCode(made.code).ok).toBe(true);
    expect(made.memberships[0]?.roles).toEqual(['lead']);
  });

  it('says every value that is wrong, at its field', async () => {
    const refusal = await kit.lead.client.refused(contracts.createCommission, {
      body: { ...brief(''), dateWanted: 'soon', currency: 'XYZ' as 'EUR' },
    });
    expect(refusal.errors?.map((error) => error.pointer).sort()).toEqual([
      '/body/currency',
      '/body/dateWanted',
      '/body/title',
    ]);
  });

  it('needs a key, and under one key happens once, whatever is sent', async () => {
    const { client } = kit.lead;
    const withKey = (key: string, title: string) =>
      client.try(contracts.createCommission, { body: brief(title) }, { 'idempotency-key': key });
    expect(
      await client.try(contracts.createCommission, { body: brief('Keyless') }, { 'idempotency-key': '' }),
    ).toMatchObject({ status: 400 });
    const key = randomUUID();
    const twice = await Promise.all([withKey(key, 'Twin'), withKey(key, 'Twin'), withKey(key, 'Twin')]);
    expect(new Set(twice.map((outcome) => (outcome.ok ? outcome.body.id : 'refused'))).size).toBe(1);
    expect((await titles()).filter((title) => title === 'Twin')).toHaveLength(1);
    const reused = await withKey(key, 'Another');
    expect(reused.ok ? '' : reused.problem.code).toBe('idempotency-key-reused');
    // A first try that failed leaves the key free.
    const later = randomUUID();
    expect(
      (
        await client.try(
          contracts.createCommission,
          { body: { ...brief('Late'), leadShopId: randomUUID() } },
          { 'idempotency-key': later },
        )
      ).status,
    ).toBe(403);
    expect((await withKey(later, 'Late')).ok).toBe(true);
  });
});

describe('a save that began from an older state', () => {
  it('is told of the newer one with both values, and neither is lost', async () => {
    const made = await kit.lead.client.call(contracts.createCommission, { body: brief('Stale') });
    const params = { commissionId: made.id };
    await kit.lead.client.call(contracts.updateCommission, { params, body: { revision: 1, title: 'Theirs' } });
    const refusal = await kit.lead.client.refused(contracts.updateCommission, {
      params,
      body: { revision: 1, title: 'Mine' },
    });
    expect(refusal.code).toBe('stale-revision');
    expect(contracts.commissionView.parse(refusal.current)).toMatchObject({ title: 'Theirs', revision: 2 });
  });
});

it("a save with every column's name changes only what it may", async () => {
  const made = await kit.lead.client.call(contracts.createCommission, { body: brief('Guarded') });
  const columns = await app.services.db.query<{ column_name: string }[]>(
    `SELECT "column_name" FROM information_schema.columns WHERE "table_name" = 'commission'`,
  );
  const camel = (name: string): string => name.replace(/_(\w)/g, (_whole, letter: string) => letter.toUpperCase());
  const everything = Object.fromEntries(columns.map(({ column_name: name }) => [camel(name), 'x']));
  const allowed = {
    title: 'Renamed',
    brief: 'x',
    dateWanted: null,
    budgetMinor: 5,
    currency: 'EUR',
    state: 'at-work',
    coverFileId: null,
    revision: 1,
  };
  await kit.lead.client.call(contracts.updateCommission, {
    params: { commissionId: made.id },
    body: { ...everything, ...allowed } as never,
  });
  const [row] = await app.services.db.query<Record<string, unknown>[]>('SELECT * FROM "commission" WHERE "id" = $1', [
    made.id,
  ]);
  expect(row).toMatchObject({
    id: made.id,
    title: 'Renamed',
    revision: 2,
    member_keys: [kit.lead.shopId],
    delivered_on: null,
  });
});

describe('what fields a reader gets', () => {
  it.each([
    ['lead', true, true],
    ['client', true, true],
    ['maker', true, false],
    ['finisher', true, false],
  ] as const)('%s: brief %s, budget %s', async (who, seesBrief, seesBudget) => {
    const view = await kit[who].client.call(contracts.getCommission, { params: { commissionId: kit.commissionId } });
    expect(['brief' in view, 'budgetMinor' in view]).toEqual([seesBrief, seesBudget]);
  });

  it("a leg's estimates are for its shop and the lead, its private note for its shop alone", async () => {
    const params = { commissionId: kit.commissionId };
    const part = await kit.lead.client.call(legs.createPart, {
      params,
      body: { name: 'Hilt', kind: 'hilt', holderPartyId: kit.maker.partyId },
    });
    const leg = await kit.lead.client.call(legs.createLeg, {
      params,
      body: {
        partyId: kit.maker.partyId,
        partId: part.id,
        kind: 'machining',
        title: 'Turn',
        hopefulDays: 1,
        likelyDays: 2,
        badDays: 3,
        plannedStartOn: null,
        afterLegIds: [],
      },
    });
    await kit.maker.client.call(legs.updateLeg, {
      params: { ...params, legId: leg.id },
      body: { revision: 1, privateNote: 'Order more brass' },
    });
    const seen = async (who: 'lead' | 'maker' | 'finisher' | 'client') =>
      (await kit[who].client.call(legs.listLegs, { params })).map((one) => ['likelyDays' in one, 'privateNote' in one]);
    expect([await seen('maker'), await seen('lead'), await seen('finisher'), await seen('client')]).toEqual([
      [[true, true]],
      [[true, false]],
      [[false, false]],
      [],
    ]);
    const refusal = await kit.lead.client.refused(legs.updateLeg, {
      params: { ...params, legId: leg.id },
      body: { revision: 2, privateNote: 'mine' },
    });
    expect(refusal).toMatchObject({ code: 'not-permitted', detail: expect.stringContaining('privateNote') as string });
  });

  it('legs that would wait for each other are refused with the way round', async () => {
    const params = { commissionId: kit.commissionId };
    const [part] = await kit.lead.client.call(legs.listParts, { params });
    const make = (title: string, afterLegIds: string[]) =>
      kit.lead.client.call(legs.createLeg, {
        params,
        body: {
          partyId: kit.maker.partyId,
          partId: part?.id ?? '',
          kind: 'other',
          title,
          hopefulDays: 1,
          likelyDays: 1,
          badDays: 1,
          plannedStartOn: null,
          afterLegIds,
        },
      });
    const first = await make('First', []);
    const second = await make('Second', [first.id]);
    const refusal = await kit.lead.client.refused(legs.updateLeg, {
      params: { ...params, legId: first.id },
      body: { revision: 1, afterLegIds: [second.id] },
    });
    expect(refusal.errors?.[0]).toEqual({
      pointer: '/body/afterLegIds',
      message: 'These legs would wait for each other in a circle: First → Second → First',
    });
  });
});

describe('the list', () => {
  it('pages by its mark without a gap or a double, and takes no mark but its own', async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Awaited<ReturnType<typeof kit.lead.client.call<typeof contracts.listCommissions>>> =
        await kit.lead.client.call(contracts.listCommissions, { query: { limit: 2, ...(cursor ? { cursor } : {}) } });
      seen.push(...page.items.map((row) => row.id));
      cursor = page.nextCursor;
    } while (cursor);
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen.length).toBe((await titles()).length);
    expect(
      (await kit.lead.client.refused(contracts.listCommissions, { query: { cursor: 'made-up' } })).errors?.[0]?.pointer,
    ).toBe('/query/cursor');
  });

  it('finds by words, by code, and takes signs of patterns as they are', async () => {
    await kit.lead.client.call(contracts.createCommission, { body: brief('100% brass_work') });
    const find = async (search: string) =>
      (await kit.lead.client.call(contracts.listCommissions, { query: { search } })).items.map((row) => row.title);
    expect(await find('100%')).toEqual(['100% brass_work']);
    expect(await find('%')).toEqual(['100% brass_work']);
    expect(await find('brass_')).toEqual(['100% brass_work']);
    const [row] = (await kit.lead.client.call(contracts.listCommissions, { query: { search: 'brass_work' } })).items;
    expect(await find(row?.code ?? '')).toEqual(['100% brass_work']);
  });

  it('asks the database as often for a hundred rows as for one', async () => {
    for (let made = 0; made < 12; made += 1)
      await kit.lead.client.call(contracts.createCommission, { body: brief(`Row ${made}`) });
    // The relay looks into the outbox by itself and would be counted with the request.
    await app.stopRelays();
    const count = async (limit: number): Promise<number> => {
      const pool = poolOf(app.services.db);
      const original = pool.query.bind(pool);
      let statements = 0;
      const connect = pool.connect.bind(pool);
      pool.query = ((...args: unknown[]) => {
        statements += 1;
        return (original as (...all: unknown[]) => unknown)(...args);
      }) as typeof pool.query;
      pool.connect = ((...args: unknown[]) => {
        statements += 1;
        return (connect as (...all: unknown[]) => unknown)(...args);
      }) as typeof pool.connect;
      try {
        await kit.lead.client.call(contracts.listCommissions, { query: { limit } });
      } finally {
        Object.assign(pool, { query: original, connect });
      }
      return statements;
    };
    const few = await count(1);
    expect(few).toBeGreaterThan(0);
    expect([await count(10), await count(100)]).toEqual([few, few]);
  });
});
