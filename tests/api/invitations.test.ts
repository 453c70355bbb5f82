import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { acceptInvitation, getMe, previewInvitation } from '../../shared/contracts/accounts.ts';
import {
  createCommission,
  getCommission,
  inviteParty,
  listCommissions,
  listParties,
  withdrawInvitation,
} from '../../shared/contracts/commissions.ts';
import type { RouteInput } from '../../shared/contracts/route.ts';
import { createShop, inviteShopMember, updateShop } from '../../shared/contracts/shops.ts';
import { refreshCommissionNames } from '../../server/commands/commissions/refresh-members.ts';
import { Commission } from '../../server/entities/commission.ts';
import { Party } from '../../server/entities/party.ts';
import { makeAccount, PASSWORD, signedInAs } from '../factories/account.ts';
import { makeMember, makeShop, type MadeShop } from '../factories/shop.ts';
import { letterTo, tokenIn } from '../support/letters.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { TestClient } from '../support/test-client.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());

interface Opened {
  commissionId: string;
  lead: TestClient;
  leadShop: MadeShop;
}

async function openCommission(): Promise<Opened> {
  const leadShop = await makeShop(app);
  const lead = await signedInAs(app, await makeMember(app, leadShop, 'owner'));
  const plan = {
    title: 'The heron hilt',
    brief: 'Brass',
    dateWanted: null,
    budgetMinor: null,
    currency: 'EUR' as const,
  };
  const { id } = await lead.call(createCommission, { body: { leadShopId: leadShop.id, ...plan } });
  return { commissionId: id, lead, leadShop };
}

type Invite = RouteInput<typeof inviteParty>['body'];

/** Invites and gives the token of the letter. */
async function invite({ commissionId, lead }: Opened, body: Invite, letterNumber = 1): Promise<string> {
  await lead.call(inviteParty, { params: { commissionId }, body });
  return tokenIn(await letterTo(app, body.email, letterNumber));
}

let lastAddress = 0;
const newAddress = (): string => `invited-${(lastAddress += 1)}@bench.test`;

const newAccount = { displayName: 'Ada Quill', password: 'seven grey herons at dusk', timeZone: 'Europe/Berlin' };
const newShop = { name: 'Quill & Awl', country: 'DE' };
const inFuture = '2099-01-01';

/** What lists of commissions read, straight from the table. */
const namesOf = async (id: string): Promise<Pick<Commission, 'memberKeys' | 'leadName' | 'clientName'>> => {
  const { memberKeys, leadName, clientName } = await app.services.db.manager.findOneByOrFail(Commission, { id });
  return { memberKeys: memberKeys.sort(), leadName, clientName };
};

describe('an invitation as work', () => {
  it('arrives by letter and shows what it offers before anyone signs in', async () => {
    const opened = await openCommission();
    const email = newAddress();
    const token = await invite(opened, { kind: 'shop', email, roles: ['finisher'] });
    const letter = await letterTo(app, email);
    expect(letter.text).toContain(`${app.origin}/invitation#token=${token}`);
    expect(letter.subject).toContain('The heron hilt');
    const preview = await new TestClient(app).call(previewInvitation, { body: { token } });
    expect(preview).toMatchObject({
      kind: 'commission',
      commissionTitle: 'The heron hilt',
      roles: ['finisher'],
      email,
      forYou: false,
      yourShops: [],
      needsShop: true,
    });
  });

  it('makes account, shop and party at once, and everyone concerned sees it', async () => {
    const opened = await openCommission();
    const { commissionId, lead, leadShop } = opened;
    const email = newAddress();
    const token = await invite(opened, { kind: 'shop', email, roles: ['finisher'] });
    const client = new TestClient(app);
    const accepted = await client.call(acceptInvitation, { body: { token, newAccount, newShop } });
    expect(accepted).toMatchObject({ commissionId, signedIn: true });
    expect(await client.call(getMe)).toMatchObject({
      email,
      displayName: 'Ada Quill',
      timeZone: 'Europe/Berlin',
      shops: [{ shopId: accepted.shopId, name: 'Quill & Awl', role: 'owner' }],
    });
    const { memberships } = await client.call(getCommission, { params: { commissionId } });
    expect(memberships).toMatchObject([{ roles: ['finisher'], shopId: accepted.shopId, shopRole: 'owner' }]);
    expect((await client.call(listCommissions)).items.map((row) => row.id)).toEqual([commissionId]);
    const { parties, invitations } = await lead.call(listParties, { params: { commissionId } });
    expect(parties.map((party) => party.displayName)).toContain('Quill & Awl');
    expect(invitations).toEqual([]);
    expect(await namesOf(commissionId)).toEqual({
      memberKeys: [accepted.shopId, leadShop.id].sort(),
      leadName: leadShop.name,
      clientName: null,
    });
    const [line] = await app.services.db.query<{ words: string }[]>(
      `SELECT "words" FROM "history_line" WHERE "commission_id" = $1 AND "subject" = 'parties'`,
      [commissionId],
    );
    expect(line?.words).toBe('Quill & Awl joined as finisher');
    await signedInAs(app, { email }, newAccount.password);
  });

  it('is taken with one of the own shops by someone who has an account', async () => {
    const opened = await openCommission();
    const shop = await makeShop(app);
    const person = await makeMember(app, shop, 'hand');
    const token = await invite(opened, { kind: 'shop', email: person.email, roles: ['maker'] });
    const client = await signedInAs(app, person);
    const preview = await client.call(previewInvitation, { body: { token } });
    expect(preview).toMatchObject({ forYou: true, yourShops: [{ shopId: shop.id, name: shop.name }] });
    const accepted = await client.call(acceptInvitation, { body: { token, shopId: shop.id } });
    expect(accepted).toEqual({ commissionId: opened.commissionId, shopId: shop.id, signedIn: true });
    // The shop takes part, so its other people see the commission too.
    const colleague = await signedInAs(app, await makeMember(app, shop, 'hand'));
    await colleague.call(getCommission, { params: { commissionId: opened.commissionId } });
  });

  it('adds a kind of work to a shop that takes part already', async () => {
    const opened = await openCommission();
    const { commissionId } = opened;
    const shop = await makeShop(app);
    const person = await makeMember(app, shop, 'owner');
    const client = await signedInAs(app, person);
    for (const [roles, number] of [
      [['maker'], 1],
      [['maker', 'installer'], 2],
    ] as const) {
      const token = await invite(opened, { kind: 'shop', email: person.email, roles: [...roles] }, number);
      await client.call(acceptInvitation, { body: { token, shopId: shop.id } });
    }
    const { memberships } = await client.call(getCommission, { params: { commissionId } });
    expect(memberships.map((membership) => membership.roles)).toEqual([['maker', 'installer']]);
  });

  it('is not taken for a shop of someone else, nor by a bookkeeper, nor without a shop', async () => {
    const opened = await openCommission();
    const [foreign, own] = [await makeShop(app), await makeShop(app)];
    const person = await makeMember(app, own, 'bookkeeper');
    const token = await invite(opened, { kind: 'shop', email: person.email, roles: ['maker'] });
    const client = await signedInAs(app, person);
    for (const shopId of [foreign.id, opened.leadShop.id, undefined]) {
      const problem = await client.refused(acceptInvitation, { body: { token, ...(shopId ? { shopId } : {}) } });
      expect(problem).toMatchObject({ code: 'input-invalid', errors: [{ pointer: '/body/shopId' }] });
    }
    expect((await client.refused(acceptInvitation, { body: { token, shopId: own.id } })).code).toBe('not-permitted');
    // All was refused whole, so the link is still good.
    await client.call(acceptInvitation, { body: { token, newShop } });
  });

  it('keeps every shop that joins at the same moment', async () => {
    const opened = await openCommission();
    const made = await Promise.all(
      Array.from({ length: 4 }, async () => {
        const shop = await makeShop(app);
        const person = await makeMember(app, shop, 'owner');
        const token = await invite(opened, { kind: 'shop', email: person.email, roles: ['maker'] });
        return { shop, token, client: await signedInAs(app, person) };
      }),
    );
    await Promise.all(
      made.map(({ client, token, shop }) => client.call(acceptInvitation, { body: { token, shopId: shop.id } })),
    );
    const { memberKeys } = await namesOf(opened.commissionId);
    expect(memberKeys).toEqual([opened.leadShop.id, ...made.map(({ shop }) => shop.id)].sort());
  });

  it('is kept when the lead’s shop is renamed at the same moment', async () => {
    const { commissionId, lead, leadShop } = await openCommission();
    const joining = await makeShop(app);
    const runner = app.services.db.createQueryRunner();
    await runner.startTransaction();
    await runner.manager.insert(Party, { commissionId, shopId: joining.id, roles: ['maker'] });
    await refreshCommissionNames(runner.manager, commissionId);
    const renamed = lead.call(updateShop, { params: { shopId: leadShop.id }, body: { revision: 1, name: 'Renamed' } });
    const waiting = `SELECT 1 FROM pg_stat_activity WHERE datname = current_database() AND wait_event_type = 'Lock'`;
    await expect.poll(() => app.services.db.query<object[]>(waiting), { timeout: 5000 }).toHaveLength(1);
    await runner.commitTransaction();
    await runner.release();
    await renamed;
    expect(await namesOf(commissionId)).toEqual({
      memberKeys: [leadShop.id, joining.id].sort(),
      leadName: 'Renamed',
      clientName: null,
    });
  });
});

describe('an invitation as the client', () => {
  it('is for the person and needs no shop', async () => {
    const opened = await openCommission();
    const { commissionId } = opened;
    const email = newAddress();
    const token = await invite(opened, { kind: 'client', email });
    const client = new TestClient(app);
    expect((await client.call(previewInvitation, { body: { token } })).needsShop).toBe(false);
    expect(await client.call(acceptInvitation, { body: { token, newAccount } })).toEqual({
      commissionId,
      shopId: null,
      signedIn: true,
    });
    const me = await client.call(getMe);
    expect(await namesOf(commissionId)).toMatchObject({
      clientName: 'Ada Quill',
      memberKeys: [me.id, opened.leadShop.id].sort(),
    });
  });

  it('turns a guest into the client, with the client’s sight', async () => {
    const opened = await openCommission();
    const { commissionId } = opened;
    const person = await makeAccount(app);
    const client = await signedInAs(app, person);
    const guest = { kind: 'guest' as const, email: person.email, sees: ['standing' as const], seesUntil: inFuture };
    await client.call(acceptInvitation, { body: { token: await invite(opened, guest) } });
    expect((await namesOf(commissionId)).memberKeys).toEqual([opened.leadShop.id]);
    const token = await invite(opened, { kind: 'client', email: person.email }, 2);
    await client.call(acceptInvitation, { body: { token } });
    const { memberships, brief } = await client.call(getCommission, { params: { commissionId } });
    expect(memberships).toMatchObject([{ roles: ['client'], guestSees: [] }]);
    expect(brief).toBeDefined();
    expect((await namesOf(commissionId)).memberKeys).toContain(person.id);
  });
});

describe('an invitation as a guest', () => {
  it('gives what was ticked, until its day', async () => {
    const opened = await openCommission();
    const { commissionId } = opened;
    const email = newAddress();
    const token = await invite(opened, { kind: 'guest', email, sees: ['standing'], seesUntil: inFuture });
    const client = new TestClient(app);
    await client.call(acceptInvitation, { body: { token, newAccount } });
    const { memberships, brief } = await client.call(getCommission, { params: { commissionId } });
    expect(memberships).toMatchObject([{ roles: ['guest'], guestSees: ['standing'] }]);
    expect(brief).toBeUndefined();
    await app.services.db.query(`UPDATE "party" SET "sees_until" = CURRENT_DATE - 1 WHERE 'guest' = ANY("roles")`);
    expect((await client.refused(getCommission, { params: { commissionId } })).code).toBe('not-found');
  });

  it('does not take anything from someone who sees more', async () => {
    const opened = await openCommission();
    const { commissionId } = opened;
    const person = await makeAccount(app);
    const client = await signedInAs(app, person);
    await client.call(acceptInvitation, {
      body: { token: await invite(opened, { kind: 'client', email: person.email }) },
    });
    const guest = { kind: 'guest' as const, email: person.email, sees: ['standing' as const], seesUntil: inFuture };
    const token = await invite(opened, guest, 2);
    expect((await client.refused(acceptInvitation, { body: { token } })).code).toBe('already-there');
    const { memberships } = await client.call(getCommission, { params: { commissionId } });
    expect(memberships).toMatchObject([{ roles: ['client'] }]);
  });
});

describe('an invitation into a shop', () => {
  it('makes the invited person a member', async () => {
    const shop = await makeShop(app);
    const owner = await signedInAs(app, await makeMember(app, shop, 'owner'));
    const email = newAddress();
    await owner.call(inviteShopMember, { params: { shopId: shop.id }, body: { email, role: 'hand' } });
    const token = tokenIn(await letterTo(app, email));
    const client = new TestClient(app);
    expect(await client.call(previewInvitation, { body: { token } })).toMatchObject({
      kind: 'shop',
      shopName: shop.name,
      roles: ['hand'],
      needsShop: false,
    });
    const accepted = await client.call(acceptInvitation, { body: { token, newAccount } });
    expect(accepted).toEqual({ commissionId: null, shopId: shop.id, signedIn: true });
    expect((await client.call(getMe)).shops).toEqual([{ shopId: shop.id, name: shop.name, role: 'hand' }]);
  });

  it('makes the first owner of a shop that the steward opened', async () => {
    const steward = await signedInAs(app, await makeAccount(app, { isSteward: true }));
    const ownerEmail = newAddress();
    const shop = await steward.call(createShop, {
      body: { name: 'Weir Finishing', craft: 'Patina', country: 'IE', ownerEmail },
    });
    const token = tokenIn(await letterTo(app, ownerEmail));
    const client = new TestClient(app);
    await client.call(acceptInvitation, { body: { token, newAccount } });
    expect((await client.call(getMe)).shops).toEqual([{ shopId: shop.id, name: 'Weir Finishing', role: 'owner' }]);
  });

  it('is not taken by someone who belongs to it', async () => {
    const shop = await makeShop(app);
    const owner = await signedInAs(app, await makeMember(app, shop, 'owner'));
    const person = await makeAccount(app);
    await owner.call(inviteShopMember, { params: { shopId: shop.id }, body: { email: person.email, role: 'owner' } });
    const token = tokenIn(await letterTo(app, person.email));
    await makeMember(app, shop, 'hand', person);
    const client = await signedInAs(app, person);
    expect((await client.refused(acceptInvitation, { body: { token } })).code).toBe('already-there');
    expect((await client.call(getMe)).shops).toMatchObject([{ role: 'hand' }]);
  });
});

describe('an invitation link', () => {
  it('is for the invited address alone', async () => {
    const opened = await openCommission();
    const email = newAddress();
    const token = await invite(opened, { kind: 'client', email });
    const stranger = await signedInAs(app, await makeAccount(app));
    expect(await stranger.call(previewInvitation, { body: { token } })).toMatchObject({ forYou: false, yourShops: [] });
    const problem = await stranger.refused(acceptInvitation, { body: { token } });
    expect(problem.code).toBe('not-permitted');
    expect(problem.detail).toContain(email);
    // Nor does it make a second account under another address: the address is the invitation's.
    const body = { token, newAccount: { ...newAccount, email: 'other@bench.test' } as never };
    const client = new TestClient(app);
    await client.call(acceptInvitation, { body });
    expect((await client.call(getMe)).email).toBe(email);
  });

  it('asks someone with an account to sign in, and is still good then', async () => {
    const opened = await openCommission();
    const person = await makeAccount(app);
    const token = await invite(opened, { kind: 'client', email: person.email });
    const client = new TestClient(app);
    expect((await client.refused(acceptInvitation, { body: { token, newAccount } })).code).toBe('not-signed-in');
    // The password given for a new account has not become that of the old one.
    await signedInAs(app, person, PASSWORD);
    await (await signedInAs(app, person)).call(acceptInvitation, { body: { token } });
  });

  it('asks for name and password where there is no account, and not for a weak one', async () => {
    const opened = await openCommission();
    const token = await invite(opened, { kind: 'client', email: newAddress() });
    const client = new TestClient(app);
    expect((await client.refused(acceptInvitation, { body: { token } })).errors?.[0]?.pointer).toBe(
      '/body/newAccount/displayName',
    );
    const weak = { token, newAccount: { ...newAccount, password: 'passwordpassword' } };
    expect((await client.refused(acceptInvitation, { body: weak })).errors?.[0]?.pointer).toBe(
      '/body/newAccount/password',
    );
    await client.call(acceptInvitation, { body: { token, newAccount } });
  });

  it('works once, of two tries at the same moment one', async () => {
    const opened = await openCommission();
    const email = newAddress();
    const token = await invite(opened, { kind: 'shop', email, roles: ['maker'] });
    const outcomes = await Promise.all(
      [1, 2].map(() => new TestClient(app).try(acceptInvitation, { body: { token, newAccount, newShop } })),
    );
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect(outcomes.find((outcome) => !outcome.ok)).toMatchObject({ problem: { code: 'link-expired' } });
    const { parties } = await opened.lead.call(listParties, { params: { commissionId: opened.commissionId } });
    expect(parties).toHaveLength(2);
    expect((await new TestClient(app).refused(previewInvitation, { body: { token } })).code).toBe('link-expired');
  });

  it('is over when it was taken back, and after 14 days', async () => {
    const opened = await openCommission();
    const { commissionId, lead } = opened;
    const email = newAddress();
    const { id: invitationId } = await lead.call(inviteParty, {
      params: { commissionId },
      body: { kind: 'client', email },
    });
    const withdrawn = tokenIn(await letterTo(app, email));
    await lead.call(withdrawInvitation, { params: { commissionId, invitationId } });
    const again = await invite(opened, { kind: 'client', email }, 2);
    for (const token of [withdrawn, 'x'.repeat(43)]) {
      const refused = new TestClient(app);
      expect((await refused.refused(previewInvitation, { body: { token } })).code).toBe('link-expired');
      expect((await refused.refused(acceptInvitation, { body: { token, newAccount } })).code).toBe('link-expired');
    }
    await app.services.db.query(`UPDATE "invitation" SET "expires_at" = now() WHERE "email" = $1`, [email]);
    expect((await new TestClient(app).refused(acceptInvitation, { body: { token: again, newAccount } })).code).toBe(
      'link-expired',
    );
  });

  it('is good for 14 days, and its token is kept as a hash alone', async () => {
    const opened = await openCommission();
    const before = Date.now();
    const email = newAddress();
    const token = await invite(opened, { kind: 'client', email });
    const { expiresAt } = await new TestClient(app).call(previewInvitation, { body: { token } });
    const days = (Date.parse(expiresAt) - before) / 86_400_000;
    expect(days).toBeGreaterThan(13.99);
    expect(days).toBeLessThan(14.01);
    await expect
      .poll(() => app.services.db.query<object[]>('SELECT 1 FROM "outbox_message" WHERE "sent_at" IS NULL'))
      .toEqual([]);
    const kept = await app.services.db.query<object[]>(
      'SELECT to_jsonb(i) AS row FROM "invitation" i UNION ALL SELECT to_jsonb(m) FROM "outbox_message" m UNION ALL SELECT to_jsonb(k) FROM "idempotency_key" k',
    );
    expect(kept.length).toBeGreaterThan(0);
    expect(JSON.stringify(kept)).not.toContain(token);
  });
});
