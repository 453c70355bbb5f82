import fc from 'fast-check';
import pg from 'pg';
import { afterAll, beforeAll, expect, inject, it } from 'vitest';
import { abilityFor, mayDo } from '../../shared/abilities/ability.ts';
import type { Actor, Membership } from '../../shared/abilities/actor.ts';
import type { SubjectFacts, SubjectName } from '../../shared/abilities/subjects.ts';
import { AUDIENCES, PARTY_ROLES, SHOP_ROLES } from '../../shared/contracts/vocabulary.ts';
import { abilityToSql } from '../../server/policies/ability-to-sql.ts';
import { createTestDatabase, dropTestDatabase } from '../support/test-database.ts';

const CASES = 300;

/** A handful of ids, so that rules and rows meet often. */
const id = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;
const [COMMISSIONS, PARTIES, SHOPS, PEOPLE] = [
  [1, 2],
  [11, 12, 13],
  [21, 22],
  [31, 32],
].map((numbers) => numbers.map(id)) as [string[], string[], string[], string[]];
const one = (ids: readonly string[]) => fc.constantFrom(...ids);

const membership: fc.Arbitrary<Membership> = fc
  .record({
    commissionId: one(COMMISSIONS),
    partyId: one(PARTIES),
    roles: fc.uniqueArray(fc.constantFrom(...PARTY_ROLES), { minLength: 1, maxLength: 2 }),
    shopId: fc.option(one(SHOPS)),
    shopRole: fc.option(fc.constantFrom(...SHOP_ROLES)),
    guestSees: fc.uniqueArray(fc.constantFrom('standing', 'pictures', 'threads', 'parts'), { maxLength: 3 }),
  })
  .map((made) => made as Membership);

const actor: fc.Arbitrary<Actor> = fc.record({
  accountId: one(PEOPLE),
  isSteward: fc.boolean(),
  shops: fc.array(fc.record({ shopId: one(SHOPS), role: fc.constantFrom(...SHOP_ROLES) }), { maxLength: 2 }),
  memberships: fc.array(membership, { maxLength: 3 }),
});

interface Case<N extends SubjectName> {
  facts: fc.Arbitrary<SubjectFacts[N]>;
  columns: (facts: SubjectFacts[N]) => Record<string, [type: string, value: unknown]>;
}

/** How each subject's facts lie in a row. */
const CASES_BY_SUBJECT: { [N in 'Commission' | 'Leg' | 'Joint' | 'FitReport' | 'Handoff' | 'Thread']: Case<N> } = {
  Commission: {
    facts: fc.record({ id: one(COMMISSIONS), memberKeys: fc.array(one([...SHOPS, ...PEOPLE]), { maxLength: 3 }) }),
    columns: (facts) => ({ id: ['uuid', facts.id], member_keys: ['uuid[]', facts.memberKeys] }),
  },
  Leg: {
    facts: fc.record({ commissionId: one(COMMISSIONS), partyId: one(PARTIES) }),
    columns: (facts) => ({ commission_id: ['uuid', facts.commissionId], party_id: ['uuid', facts.partyId] }),
  },
  Joint: {
    facts: fc.record({ commissionId: one(COMMISSIONS), holePartyId: one(PARTIES), shaftPartyId: one(PARTIES) }),
    columns: (facts) => ({
      commission_id: ['uuid', facts.commissionId],
      hole_party_id: ['uuid', facts.holePartyId],
      shaft_party_id: ['uuid', facts.shaftPartyId],
    }),
  },
  FitReport: {
    facts: fc.record({ commissionId: one(COMMISSIONS), raisedByPartyId: one(PARTIES), answerPartyId: one(PARTIES) }),
    columns: (facts) => ({
      commission_id: ['uuid', facts.commissionId],
      raised_by_party_id: ['uuid', facts.raisedByPartyId],
      answer_party_id: ['uuid', facts.answerPartyId],
    }),
  },
  Handoff: {
    facts: fc.record({ commissionId: one(COMMISSIONS), fromPartyId: one(PARTIES), toPartyId: one(PARTIES) }),
    columns: (facts) => ({
      commission_id: ['uuid', facts.commissionId],
      from_party_id: ['uuid', facts.fromPartyId],
      to_party_id: ['uuid', facts.toPartyId],
    }),
  },
  Thread: {
    facts: fc.record({
      commissionId: one(COMMISSIONS),
      audience: fc.constantFrom(...AUDIENCES),
      partyIds: fc.array(one(PARTIES), { maxLength: 2 }),
    }),
    columns: (facts) => ({
      commission_id: ['uuid', facts.commissionId],
      audience: ['text', facts.audience],
      party_ids: ['uuid[]', facts.partyIds],
    }),
  },
};

let url: string;
let database: pg.Client;
beforeAll(async () => {
  url = await createTestDatabase(inject('adminUrl'));
  database = new pg.Client({ connectionString: url });
  await database.connect();
});
afterAll(async () => {
  await database.end();
  await dropTestDatabase(inject('adminUrl'), url);
});

/** Whether the fragment lets a row with these columns through. */
async function sqlAllows(who: Actor, name: SubjectName, columns: Record<string, [string, unknown]>): Promise<boolean> {
  const entries = Object.entries(columns);
  const fragment = abilityToSql(abilityFor(who), 'read', name, 't', entries.length + 1);
  const row = entries.map(([column, [type]], index) => `$${index + 1}::${type} AS "${column}"`).join(', ');
  const { rowCount } = await database.query(`SELECT 1 FROM (SELECT ${row}) t WHERE ${fragment.sql}`, [
    ...entries.map(([, [, value]]) => value),
    ...fragment.params,
  ]);
  return rowCount === 1;
}

it.each(Object.keys(CASES_BY_SUBJECT) as (keyof typeof CASES_BY_SUBJECT)[])(
  '%s: a list returns a row exactly when the ability allows it',
  async (name) => {
    const { facts, columns } = CASES_BY_SUBJECT[name] as unknown as Case<typeof name>;
    let allowed = 0;
    await fc.assert(
      fc.asyncProperty(actor, facts, async (who, row) => {
        const may = mayDo(abilityFor(who), 'read', name, row);
        allowed += Number(may);
        expect(await sqlAllows(who, name, columns(row))).toBe(may);
      }),
      { numRuns: CASES },
    );
    // Both answers were tried, or the comparison says nothing.
    expect(allowed).toBeGreaterThan(CASES / 20);
    expect(allowed).toBeLessThan(CASES);
  },
);

it("a rule that has no SQL throws, and nobody's ability gives no row", async () => {
  expect(() =>
    abilityToSql(
      abilityFor({ accountId: id(31), isSteward: false, shops: [], memberships: [] }),
      'read',
      'Standing',
      't',
      1,
    ),
  ).toThrow('No columns');
  expect(
    await sqlAllows(
      { accountId: id(31), isSteward: true, shops: [], memberships: [] },
      'Thread',
      CASES_BY_SUBJECT.Thread.columns({ commissionId: id(1), audience: 'everyone', partyIds: [] }),
    ),
  ).toBe(false);
});
