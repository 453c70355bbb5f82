import { randomUUID } from 'node:crypto';
import { IsNull } from 'typeorm';
import type { PartyRole } from '../../shared/contracts/vocabulary.ts';
import { encodeCode } from '../../shared/engines/codes/crockford.ts';
import { refreshCommissionNames } from '../../server/commands/commissions/refresh-members.ts';
import { Commission } from '../../server/entities/commission.ts';
import { Party } from '../../server/entities/party.ts';
import { Thread } from '../../server/entities/thread.ts';
import type { Audience } from '../../shared/contracts/vocabulary.ts';
import { makeAccount, signedInAs, type MadeAccount } from '../factories/account.ts';
import { makeMember, makeShop } from '../factories/shop.ts';
import type { TestApp } from './test-app.ts';
import type { TestClient } from './test-client.ts';

export interface KitParty {
  partyId: string;
  shopId: string | null;
  person: MadeAccount;
  client: TestClient;
}

export interface CommissionKit {
  commissionId: string;
  lead: KitParty;
  maker: KitParty;
  finisher: KitParty;
  client: KitParty;
}

let codes = 1n;

/** A commission with a lead, two shops and a client, each with a person who is signed in. */
export async function makeCommissionKit(app: TestApp): Promise<CommissionKit> {
  const { manager } = app.services.db;
  const commissionId = randomUUID();
  await manager.insert(Commission, { id: commissionId, code: encodeCode(codes++), title: 'The Test Piece' });
  const join = async (roles: PartyRole[]): Promise<KitParty> => {
    const isShop = !roles.includes('client');
    const shop = isShop ? await makeShop(app) : null;
    const person = shop ? await makeMember(app, shop) : await makeAccount(app);
    const partyId = randomUUID();
    await manager.insert(Party, {
      id: partyId,
      commissionId,
      roles,
      shopId: shop?.id ?? null,
      accountId: shop ? null : person.id,
    });
    return { partyId, shopId: shop?.id ?? null, person, client: await signedInAs(app, person) };
  };
  const kit = {
    commissionId,
    lead: await join(['lead', 'installer']),
    maker: await join(['maker']),
    finisher: await join(['finisher']),
    client: await join(['client']),
  };
  await refreshCommissionNames(manager, commissionId);
  return kit;
}

/** A thread on the commission itself, put there directly. */
export async function makeThread(
  app: TestApp,
  kit: CommissionKit,
  audience: Audience,
  partyIds: string[] = [],
): Promise<string> {
  const id = randomUUID();
  await app.services.db.manager.insert(Thread, {
    id,
    commissionId: kit.commissionId,
    subject: 'commission',
    subjectId: kit.commissionId,
    title: `Thread for ${audience}`,
    audience,
    partyIds,
    openedByPartyId: kit.lead.partyId,
  });
  return id;
}

/** Takes a party out as the command does, without its checks on parts and legs. */
export async function expelParty(app: TestApp, kit: CommissionKit, party: KitParty): Promise<void> {
  const { manager } = app.services.db;
  await manager.update(Party, { id: party.partyId, leftAt: IsNull() }, { leftAt: new Date() });
  await refreshCommissionNames(manager, kit.commissionId);
}
