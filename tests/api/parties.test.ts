import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as contracts from '../../shared/contracts/commissions.ts';
import { createLeg, createPart, moveLeg, updatePart } from '../../shared/contracts/parts-and-legs.ts';
import { makeAccount, signedInAs } from '../factories/account.ts';
import { makeMember } from '../factories/shop.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

let kit: CommissionKit;
let params: { commissionId: string };
beforeEach(async () => {
  kit = await makeCommissionKit(app);
  params = { commissionId: kit.commissionId };
});

type Who = 'lead' | 'maker' | 'finisher' | 'client';
const list = (who: Who) => kit[who].client.call(contracts.listParties, { params });
const remove = (partyId: string, who: Who = 'lead') =>
  kit[who].client.try(contracts.removeParty, { params: { ...params, partyId } });
const detailOf = (outcome: Awaited<ReturnType<typeof remove>>): string | undefined =>
  outcome.ok ? 'taken out' : outcome.problem.detail;

describe('who takes part', () => {
  it('is seen by everyone in it: shops with their people but not their bookkeepers', async () => {
    await makeMember(app, { id: kit.maker.shopId ?? '' }, 'bookkeeper');
    const hand = await makeMember(app, { id: kit.maker.shopId ?? '' }, 'hand');
    for (const who of ['lead', 'maker', 'client'] as const) {
      const { parties } = await list(who);
      expect(parties.map((party) => party.id).sort()).toEqual(
        [kit.lead, kit.maker, kit.finisher, kit.client].map((party) => party.partyId).sort(),
      );
      const maker = parties.find((party) => party.id === kit.maker.partyId);
      expect(maker?.people.map((person) => person.accountId).sort()).toEqual([kit.maker.person.id, hand.id].sort());
    }
  });

  it('never shows an e-mail address of anyone, and open invitations to the lead alone', async () => {
    await kit.lead.client.call(contracts.inviteParty, {
      params,
      body: { kind: 'shop', email: 'blades@bench.test', roles: ['maker'] },
    });
    expect((await list('lead')).invitations.map((invitation) => invitation.email)).toEqual(['blades@bench.test']);
    for (const who of ['maker', 'client'] as const) expect(JSON.stringify(await list(who))).not.toContain('@');
  });
});

describe('an invitation', () => {
  const invite = (body: unknown) => kit.lead.client.try(contracts.inviteParty, { params, body: body as never });

  it.each([
    ['no kind of work', { kind: 'shop', email: 'a@bench.test', roles: [] }, '/body/roles'],
    ['the lead, of which there is one', { kind: 'shop', email: 'a@bench.test', roles: ['lead'] }, '/body/roles/0'],
    ['no address', { kind: 'client', email: 'somebody' }, '/body/email'],
    ['nothing to see', { kind: 'guest', email: 'a@bench.test', sees: [], seesUntil: '2099-01-01' }, '/body/sees'],
    [
      'a day that is past',
      { kind: 'guest', email: 'a@bench.test', sees: ['standing'], seesUntil: '2020-01-01' },
      '/body/seesUntil',
    ],
  ])('for %s is refused at its field', async (_case, body, pointer) => {
    const outcome = await invite(body);
    expect(outcome.ok ? [] : outcome.problem.errors?.map((error) => error.pointer)).toEqual([pointer]);
    expect((await list('lead')).invitations).toEqual([]);
  });

  it('of one address waits once, also when it is sent twice at the same moment', async () => {
    const body = { kind: 'client', email: 'twice@bench.test' };
    const outcomes = await Promise.all([invite(body), invite(body)]);
    expect(outcomes.map((outcome) => outcome.status).sort()).toEqual([201, 409]);
    expect((await list('lead')).invitations).toHaveLength(1);
  });

  it("of another commission is not taken back through one's own", async () => {
    const other = await makeCommissionKit(app);
    const theirs = { commissionId: other.commissionId };
    const { id } = await other.lead.client.call(contracts.inviteParty, {
      params: theirs,
      body: { kind: 'client', email: 'theirs@bench.test' },
    });
    expect(
      (await kit.lead.client.refused(contracts.withdrawInvitation, { params: { ...params, invitationId: id } })).code,
    ).toBe('not-found');
    expect(
      (await other.lead.client.call(contracts.listParties, { params: theirs })).invitations.map((one) => one.id),
    ).toEqual([id]);
  });
});

describe('taking a party out', () => {
  it('ends its sight of everything at once, and the others see it no more', async () => {
    expect((await remove(kit.finisher.partyId)).status).toBe(204);
    for (const route of [contracts.getCommission, contracts.listParties] as const)
      expect((await kit.finisher.client.refused(route, { params })).code).toBe('not-found');
    expect((await kit.finisher.client.call(contracts.listCommissions)).items).toEqual([]);
    expect((await list('lead')).parties.map((party) => party.id)).not.toContain(kit.finisher.partyId);
  });

  it('waits until it holds no part, and names what it holds', async () => {
    const part = await kit.lead.client.call(createPart, {
      params,
      body: { name: 'Pommel', kind: 'pommel', holderPartyId: kit.maker.partyId },
    });
    const refused = await remove(kit.maker.partyId);
    expect([refused.status, detailOf(refused)]).toEqual([409, expect.stringContaining('Pommel')]);
    await kit.lead.client.call(updatePart, {
      params: { ...params, partId: part.id },
      body: { revision: 1, holderPartyId: kit.lead.partyId },
    });
    expect((await remove(kit.maker.partyId)).status).toBe(204);
  });

  it('waits until it has no leg to do, and names it', async () => {
    const part = await kit.lead.client.call(createPart, {
      params,
      body: { name: 'Hilt', kind: 'hilt', holderPartyId: kit.lead.partyId },
    });
    const leg = await kit.lead.client.call(createLeg, {
      params,
      body: {
        partyId: kit.maker.partyId,
        partId: part.id,
        kind: 'machining',
        title: 'Turn the hilt',
        hopefulDays: 1,
        likelyDays: 2,
        badDays: 3,
        plannedStartOn: null,
        afterLegIds: [],
      },
    });
    const refused = await remove(kit.maker.partyId);
    expect([refused.status, detailOf(refused)]).toEqual([409, expect.stringContaining('Turn the hilt')]);
    await kit.lead.client.call(moveLeg, {
      params: { ...params, legId: leg.id },
      body: { revision: 1, state: 'dropped', onDay: '2026-03-02' },
    });
    expect((await remove(kit.maker.partyId)).status).toBe(204);
  });

  it('never takes the lead', async () => {
    expect((await remove(kit.lead.partyId)).status).toBe(409);
  });

  it('and giving it a part at the same moment end with every part held by someone who takes part', async () => {
    const races = Array.from({ length: 6 }, (_unused, index) => index);
    for (const race of races) {
      const mine = race === 0 ? kit : await makeCommissionKit(app);
      const where = { commissionId: mine.commissionId };
      await Promise.all([
        mine.lead.client.try(contracts.removeParty, { params: { ...where, partyId: mine.finisher.partyId } }),
        mine.lead.client.try(createPart, {
          params: where,
          body: { name: 'Blade', kind: 'blade', holderPartyId: mine.finisher.partyId },
        }),
      ]);
      const [row] = await app.services.db.query<{ orphans: number }[]>(
        `SELECT count(*)::int AS orphans FROM "part" t JOIN "party" p ON p."id" = t."holder_party_id"
         WHERE t."commission_id" = $1 AND p."left_at" IS NOT NULL`,
        [mine.commissionId],
      );
      expect(row?.orphans).toBe(0);
    }
  });
});

it('one who comes in as client twice over, by shop and by name, sees what either part gives and no other commission', async () => {
  const person = await makeAccount(app);
  const { manager } = app.services.db;
  await makeMember(app, { id: kit.finisher.shopId ?? '' }, 'hand', person);
  await manager.query(
    `INSERT INTO "party" ("id", "commission_id", "roles", "account_id") VALUES (gen_random_uuid(), $1, '{client}', $2)`,
    [(await makeCommissionKit(app)).commissionId, person.id],
  );
  const client = await signedInAs(app, person);
  // Client elsewhere, finisher here: the budget is the client's to see there and not here.
  expect('budgetMinor' in (await client.call(contracts.getCommission, { params }))).toBe(false);
  expect(
    (await client.refused(contracts.updateCommission, { params, body: { revision: 1, title: 'Mine' } })).code,
  ).toBe('not-permitted');
});
