import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getMe } from '../../shared/contracts/accounts.ts';
import { createCommission, getCommission } from '../../shared/contracts/commissions.ts';
import * as shops from '../../shared/contracts/shops.ts';
import type { ShopRole } from '../../shared/contracts/vocabulary.ts';
import { makeAccount, signedInAs, type MadeAccount } from '../factories/account.ts';
import { makeMember, makeShop, type MadeShop } from '../factories/shop.ts';
import { letterTo, lettersTo } from '../support/letters.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { TestClient } from '../support/test-client.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

interface Staffed {
  shop: MadeShop;
  inShop: { params: { shopId: string } };
  people: Record<ShopRole, MadeAccount>;
  as: Record<ShopRole | 'stranger' | 'nobody', TestClient>;
}

/** A shop with one person in each role, each signed in, and a stranger who owns another shop. */
async function makeStaffed(): Promise<Staffed> {
  const shop = await makeShop(app);
  const [owner, hand, bookkeeper, stranger] = await Promise.all([
    makeMember(app, shop, 'owner'),
    makeMember(app, shop, 'hand'),
    makeMember(app, shop, 'bookkeeper'),
    makeShop(app).then((other) => makeMember(app, other, 'owner')),
  ]);
  const as = {
    owner: await signedInAs(app, owner),
    hand: await signedInAs(app, hand),
    bookkeeper: await signedInAs(app, bookkeeper),
    stranger: await signedInAs(app, stranger),
    nobody: new TestClient(app),
  };
  return { shop, inShop: { params: { shopId: shop.id } }, people: { owner, hand, bookkeeper }, as };
}

let lastAddress = 0;
const newAddress = (): string => `shop-${(lastAddress += 1)}@bench.test`;

describe('the steward', () => {
  const plan = (ownerEmail: string) => ({
    body: { name: 'Weir Finishing', craft: 'Patina', country: 'IE', ownerEmail },
  });

  it('opens a shop, whose owner is invited by letter', async () => {
    const steward = await signedInAs(app, await makeAccount(app, { isSteward: true }));
    const ownerEmail = newAddress();
    const shop = await steward.call(shops.createShop, plan(ownerEmail));
    expect(shop).toMatchObject({ name: 'Weir Finishing', country: 'IE', revision: 1, yourRole: null });
    expect((await letterTo(app, ownerEmail)).text).toContain('Weir Finishing');
    expect((await steward.call(shops.listShops)).map((one) => one.id)).toContain(shop.id);
    // Opening a shop is not belonging to it.
    expect((await steward.refused(shops.getShop, { params: { shopId: shop.id } })).code).toBe('not-found');
    expect((await steward.refused(shops.listShopMembers, { params: { shopId: shop.id } })).code).toBe('not-found');
  });

  it('opens one shop when the same request comes twice', async () => {
    const steward = await signedInAs(app, await makeAccount(app, { isSteward: true }));
    const ownerEmail = newAddress();
    const key = { 'idempotency-key': `twice-${ownerEmail}` };
    const outcomes = await Promise.all([1, 2].map(() => steward.try(shops.createShop, plan(ownerEmail), key)));
    expect(outcomes[0]).toMatchObject({ ok: true, status: 201 });
    expect(outcomes[1]).toEqual(outcomes[0]);
    await letterTo(app, ownerEmail);
    expect(await lettersTo(app, ownerEmail)).toHaveLength(1);
  });

  it('is the only one who lists and opens shops', async () => {
    const { as } = await makeStaffed();
    for (const client of [as.owner, as.hand]) {
      expect((await client.refused(shops.listShops)).code).toBe('not-permitted');
      expect((await client.refused(shops.createShop, plan(newAddress()))).code).toBe('not-permitted');
    }
    expect((await as.nobody.refused(shops.listShops)).code).toBe('not-signed-in');
    expect((await as.nobody.refused(shops.createShop, plan(newAddress()))).code).toBe('not-signed-in');
  });

  it('gives a country that is one', async () => {
    const steward = await signedInAs(app, await makeAccount(app, { isSteward: true }));
    const problem = await steward.refused(shops.createShop, { body: { ...plan(newAddress()).body, country: 'ie' } });
    expect(problem.errors?.[0]?.pointer).toBe('/body/country');
  });
});

describe('a shop', () => {
  it('is seen by its people with their role, and by nobody else', async () => {
    const { as, inShop, shop } = await makeStaffed();
    for (const role of ['owner', 'hand', 'bookkeeper'] as const)
      expect(await as[role].call(shops.getShop, inShop)).toMatchObject({ id: shop.id, yourRole: role });
    expect((await as.stranger.refused(shops.getShop, inShop)).code).toBe('not-found');
    expect((await as.nobody.refused(shops.getShop, inShop)).code).toBe('not-signed-in');
    const missing = { params: { shopId: '00000000-0000-4000-8000-000000000000' } };
    expect((await as.owner.refused(shops.getShop, missing)).code).toBe('not-found');
  });

  it('is changed by an owner, and its new name shows in lists of commissions', async () => {
    const { as, inShop, shop } = await makeStaffed();
    const plan = { title: 'The heron hilt', brief: '', dateWanted: null, budgetMinor: null, currency: 'EUR' as const };
    const { id } = await as.owner.call(createCommission, { body: { leadShopId: shop.id, ...plan } });
    const changes = { name: 'Awl & Quill', craft: '', country: 'AT', timeZone: 'Europe/Vienna', tint: 'moss' as const };
    const changed = await as.owner.call(shops.updateShop, { ...inShop, body: { revision: 1, ...changes } });
    expect(changed).toMatchObject({ ...changes, revision: 2, yourRole: 'owner' });
    const seen = await as.hand.call(getCommission, { params: { commissionId: id } });
    expect(seen.leadName).toBe('Awl & Quill');
  });

  it('is not changed by hands, bookkeepers or strangers', async () => {
    const { as, inShop } = await makeStaffed();
    const input = { ...inShop, body: { revision: 1, name: 'Taken over' } };
    expect((await as.hand.refused(shops.updateShop, input)).code).toBe('not-permitted');
    expect((await as.bookkeeper.refused(shops.updateShop, input)).code).toBe('not-permitted');
    expect((await as.stranger.refused(shops.updateShop, input)).code).toBe('not-found');
    expect((await as.nobody.refused(shops.updateShop, input)).code).toBe('not-signed-in');
    expect(await as.owner.call(shops.getShop, inShop)).toMatchObject({ revision: 1 });
  });

  it('is saved once when two save from the same revision; the other is shown what stands', async () => {
    const { as, inShop } = await makeStaffed();
    const names = ['One name', 'Another name'];
    const outcomes = await Promise.all(
      names.map((name) => as.owner.try(shops.updateShop, { ...inShop, body: { revision: 1, name } })),
    );
    const saved = names[outcomes.findIndex((outcome) => outcome.ok)];
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect(outcomes.find((outcome) => !outcome.ok)).toMatchObject({
      status: 409,
      problem: { code: 'stale-revision', current: { name: saved, revision: 2, yourRole: 'owner' } },
    });
  });

  it.each([
    ['timeZone', 'Mars/Olympus'],
    ['country', 'Germany'],
    ['tint', 'crimson'],
    ['name', '   '],
  ])('does not take a wrong %s', async (field, value) => {
    const { as, inShop } = await makeStaffed();
    const problem = await as.owner.refused(shops.updateShop, { ...inShop, body: { revision: 1, [field]: value } });
    expect(problem.errors?.[0]?.pointer).toBe(`/body/${field}`);
  });

  it('changes in nothing that its form does not have', async () => {
    const { as, inShop, shop } = await makeStaffed();
    const body = { revision: 1, id: '00000000-0000-4000-8000-000000000000', createdAt: '1999-01-01' };
    expect(await as.owner.call(shops.updateShop, { ...inShop, body })).toMatchObject({ id: shop.id, revision: 2 });
    const [row] = await app.services.db.query<{ created_at: Date }[]>(
      'SELECT "created_at" FROM "shop" WHERE "id" = $1',
      [shop.id],
    );
    expect(row?.created_at.getFullYear()).toBeGreaterThan(2000);
  });
});

describe('people of a shop', () => {
  it('are seen by its people; open invitations by owners alone', async () => {
    const { as, inShop, people } = await makeStaffed();
    const email = newAddress();
    await as.owner.call(shops.inviteShopMember, { ...inShop, body: { email, role: 'hand' } });
    const seen = await as.owner.call(shops.listShopMembers, inShop);
    expect(new Map(seen.members.map((member) => [member.accountId, member.role]))).toEqual(
      new Map([
        [people.owner.id, 'owner'],
        [people.hand.id, 'hand'],
        [people.bookkeeper.id, 'bookkeeper'],
      ]),
    );
    expect(seen.invitations).toMatchObject([{ email, role: 'hand' }]);
    for (const role of ['hand', 'bookkeeper'] as const) {
      const { members, invitations } = await as[role].call(shops.listShopMembers, inShop);
      expect(members).toHaveLength(3);
      expect(invitations).toEqual([]);
    }
    expect((await as.stranger.refused(shops.listShopMembers, inShop)).code).toBe('not-found');
    expect((await as.nobody.refused(shops.listShopMembers, inShop)).code).toBe('not-signed-in');
  });

  it('are invited by an owner, once for each address', async () => {
    const { as, inShop, people } = await makeStaffed();
    const email = newAddress();
    const input = { ...inShop, body: { email, role: 'owner' as const } };
    expect((await as.hand.refused(shops.inviteShopMember, input)).code).toBe('not-permitted');
    expect((await as.bookkeeper.refused(shops.inviteShopMember, input)).code).toBe('not-permitted');
    expect((await as.stranger.refused(shops.inviteShopMember, input)).code).toBe('not-found');
    expect((await as.nobody.refused(shops.inviteShopMember, input)).code).toBe('not-signed-in');
    const both = await Promise.all([1, 2].map(() => as.owner.try(shops.inviteShopMember, input)));
    expect(both.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect(both.find((outcome) => !outcome.ok)).toMatchObject({ problem: { code: 'already-there' } });
    const inside = { ...inShop, body: { email: people.hand.email, role: 'owner' as const } };
    expect((await as.owner.refused(shops.inviteShopMember, inside)).code).toBe('already-there');
    expect((await letterTo(app, email)).text).toContain('as owner');
    expect(await lettersTo(app, email)).toHaveLength(1);
  });

  it('can be invited many at once: no invitation waits for a connection that another one holds', async () => {
    const { as, inShop } = await makeStaffed();
    const outcomes = await Promise.all(
      Array.from({ length: 14 }, () =>
        as.owner.try(shops.inviteShopMember, { ...inShop, body: { email: newAddress(), role: 'hand' } }),
      ),
    );
    expect(outcomes.map((outcome) => outcome.status)).toEqual(Array.from({ length: 14 }, () => 201));
  });

  it('have their invitation taken back by an owner, once', async () => {
    const { as, inShop } = await makeStaffed();
    const email = newAddress();
    const { id } = await as.owner.call(shops.inviteShopMember, { ...inShop, body: { email, role: 'hand' } });
    const input = { params: { ...inShop.params, invitationId: id } };
    expect((await as.hand.refused(shops.withdrawShopInvitation, input)).code).toBe('not-permitted');
    expect((await as.stranger.refused(shops.withdrawShopInvitation, input)).code).toBe('not-found');
    expect((await as.nobody.refused(shops.withdrawShopInvitation, input)).code).toBe('not-signed-in');
    const elsewhere = await makeStaffed();
    const throughOther = { params: { ...elsewhere.inShop.params, invitationId: id } };
    expect((await elsewhere.as.owner.refused(shops.withdrawShopInvitation, throughOther)).code).toBe('not-found');
    await as.owner.call(shops.withdrawShopInvitation, input);
    expect((await as.owner.refused(shops.withdrawShopInvitation, input)).code).toBe('not-found');
    expect((await as.owner.call(shops.listShopMembers, inShop)).invitations).toEqual([]);
    // Another can be sent then.
    await as.owner.call(shops.inviteShopMember, { ...inShop, body: { email, role: 'hand' } });
  });

  it('get another role from an owner, which holds at once', async () => {
    const { as, inShop, people } = await makeStaffed();
    const input = { params: { ...inShop.params, accountId: people.hand.id }, body: { role: 'owner' as const } };
    expect((await as.hand.refused(shops.changeShopMember, input)).code).toBe('not-permitted');
    expect((await as.stranger.refused(shops.changeShopMember, input)).code).toBe('not-found');
    expect((await as.nobody.refused(shops.changeShopMember, input)).code).toBe('not-signed-in');
    expect(await as.owner.call(shops.changeShopMember, input)).toMatchObject({
      accountId: people.hand.id,
      role: 'owner',
    });
    await as.hand.call(shops.updateShop, { ...inShop, body: { revision: 1, name: 'Renamed by the new owner' } });
    const missing = { ...input, params: { ...inShop.params, accountId: (await makeAccount(app)).id } };
    expect((await as.owner.refused(shops.changeShopMember, missing)).code).toBe('not-found');
  });

  it('are taken out by an owner, or leave; strangers and hands take nobody out', async () => {
    const { as, inShop, people } = await makeStaffed();
    const member = (accountId: string) => ({ params: { ...inShop.params, accountId } });
    expect((await as.hand.refused(shops.removeShopMember, member(people.bookkeeper.id))).code).toBe('not-permitted');
    expect((await as.stranger.refused(shops.removeShopMember, member(people.hand.id))).code).toBe('not-found');
    expect((await as.nobody.refused(shops.removeShopMember, member(people.hand.id))).code).toBe('not-signed-in');
    await as.hand.call(shops.removeShopMember, member(people.hand.id));
    expect((await as.hand.refused(shops.getShop, inShop)).code).toBe('not-found');
    await as.owner.call(shops.removeShopMember, member(people.bookkeeper.id));
    expect((await as.bookkeeper.refused(shops.getShop, inShop)).code).toBe('not-found');
    expect((await as.bookkeeper.call(getMe)).shops).toEqual([]);
    expect((await as.owner.refused(shops.removeShopMember, member(people.hand.id))).code).toBe('not-found');
  });

  it('lose the shop’s commissions with the shop, and everyone concerned is told', async () => {
    const { as, inShop, shop, people } = await makeStaffed();
    const plan = { title: 'The heron hilt', brief: '', dateWanted: null, budgetMinor: null, currency: 'EUR' as const };
    const { id: commissionId } = await as.owner.call(createCommission, { body: { leadShopId: shop.id, ...plan } });
    await as.hand.call(getCommission, { params: { commissionId } });
    await as.owner.call(shops.removeShopMember, { params: { ...inShop.params, accountId: people.hand.id } });
    expect((await as.hand.refused(getCommission, { params: { commissionId } })).code).toBe('not-found');
    const told = await app.services.db.query<{ topic: string }[]>(
      `SELECT "topic" FROM "outbox_message" WHERE "topic" = 'event:membership.changed'`,
    );
    expect(told.length).toBeGreaterThan(0);
  });

  it('always have an owner among them, also when two owners act at the same moment', async () => {
    const { as, inShop, people } = await makeStaffed();
    const owner = { ...inShop.params, accountId: people.owner.id };
    const demote = { params: owner, body: { role: 'hand' as const } };
    expect((await as.owner.refused(shops.changeShopMember, demote)).code).toBe('not-in-this-state');
    expect((await as.owner.refused(shops.removeShopMember, { params: owner })).code).toBe('not-in-this-state');
    const hand = { ...inShop.params, accountId: people.hand.id };
    await as.owner.call(shops.changeShopMember, { params: hand, body: { role: 'owner' } });
    const outcomes = await Promise.all([
      as.owner.try(shops.removeShopMember, { params: owner }),
      as.hand.try(shops.removeShopMember, { params: hand }),
    ]);
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect(outcomes.find((outcome) => !outcome.ok)).toMatchObject({ problem: { code: 'not-in-this-state' } });
    const [row] = await app.services.db.query<{ count: string }[]>(
      `SELECT count(*) FROM "shop_member" WHERE "shop_id" = $1 AND "role" = 'owner'`,
      [inShop.params.shopId],
    );
    expect(row?.count).toBe('1');
  });
});
