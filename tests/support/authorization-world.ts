import { randomUUID } from 'node:crypto';
import { Commission } from '../../server/entities/commission.ts';
import { FitReport } from '../../server/entities/fit-report.ts';
import { Handoff } from '../../server/entities/handoff.ts';
import { HandoffOffer } from '../../server/entities/handoff-offer.ts';
import { Joint } from '../../server/entities/joint.ts';
import { Leg } from '../../server/entities/leg.ts';
import { Part } from '../../server/entities/part.ts';
import { Party } from '../../server/entities/party.ts';
import { ReworkNote } from '../../server/entities/rework-note.ts';
import { encodeCode } from '../../shared/engines/codes/crockford.ts';
import { refreshCommissionNames } from '../../server/commands/commissions/refresh-members.ts';
import { makeAccount, signedInAs } from '../factories/account.ts';
import { makeMember, makeShop } from '../factories/shop.ts';
import { putConsumables, type Consumables } from './authorization-consumables.ts';
import { makeCommissionKit, makeThread, type CommissionKit, type KitParty } from './commission-kit.ts';
import type { TestApp } from './test-app.ts';
import { TestClient } from './test-client.ts';

/** Who asks, in the order of the letters in the table. */
export const ROLES = [
  'anonymous',
  'lead',
  'leadHand',
  'bookkeeper',
  'maker',
  'makerHand',
  'finisher',
  'client',
  'guest',
  'removed',
  'expiredGuest',
  'outsider',
  'steward',
] as const;
export type RoleName = (typeof ROLES)[number];

/** What is asked for: the maker's own, the finisher's, one of another commission, and one that is not there. */
export const TARGETS = ['own', 'other', 'foreign', 'missing'] as const;
export type TargetName = (typeof TARGETS)[number];

/** Everything a path or body may name, for one target. */
export interface Target extends Consumables {
  shopId: string;
  partyId: string;
  partId: string;
  otherPartId: string;
  legId: string;
  jointId: string;
  reportId: string;
  noteId: string;
  handoffId: string;
  offerId: string;
  leadPartyId: string;
  leadShopId: string;
}

export interface AuthorizationWorld {
  clients: Record<RoleName, TestClient>;
  /** A session that a sign-out may end. */
  freshClient: (role: RoleName) => Promise<TestClient>;
  targets: Record<TargetName, Target>;
}

let numbers = 1000n;

/** One set of records of a commission that `party` has with the lead. */
async function makeTarget(app: TestApp, kit: CommissionKit, party: KitParty): Promise<Target> {
  const { manager } = app.services.db;
  const { commissionId, lead } = kit;
  const ids = {
    partId: randomUUID(),
    otherPartId: randomUUID(),
    legId: randomUUID(),
    jointId: randomUUID(),
    reportId: randomUUID(),
    noteId: randomUUID(),
    handoffId: randomUUID(),
    offerId: randomUUID(),
    invitationId: randomUUID(),
    shopInvitationId: randomUUID(),
    fileId: randomUUID(),
  };
  for (const id of [ids.partId, ids.otherPartId])
    await manager.insert(Part, { id, commissionId, name: 'Part', kind: 'hilt', holderPartyId: party.partyId });
  await manager.insert(Leg, {
    id: ids.legId,
    commissionId,
    partyId: party.partyId,
    partId: ids.partId,
    kind: 'machining',
    title: 'Work',
    hopefulDays: 1,
    likelyDays: 2,
    badDays: 3,
  });
  await manager.insert(Joint, {
    id: ids.jointId,
    commissionId,
    name: 'Joint',
    kind: 'other',
    holePartId: ids.partId,
    shaftPartId: ids.otherPartId,
    holePartyId: party.partyId,
    shaftPartyId: lead.partyId,
    nominalMm: 30,
    clearanceMinUm: 20,
    clearanceMaxUm: 60,
  });
  await manager.insert(FitReport, {
    id: ids.reportId,
    commissionId,
    jointId: ids.jointId,
    title: 'Tight',
    state: 'agreed',
    blocking: false,
    heldLegId: null,
    raisedByPartyId: party.partyId,
    raisedByAccountId: party.person.id,
    answerPartyId: lead.partyId,
  });
  await manager.insert(ReworkNote, {
    id: ids.noteId,
    reportId: ids.reportId,
    partyId: lead.partyId,
    accountId: lead.person.id,
    state: 'agreed',
    method: 'Turn it',
    cutSide: 'shaft',
    removeOnDiameterUm: 40,
    shows: true,
    whereItShows: 'Rim',
    consentState: 'given',
    consentAskedAt: new Date(),
  });
  await manager.insert(Handoff, {
    id: ids.handoffId,
    commissionId,
    fromPartyId: party.partyId,
    toPartyId: lead.partyId,
    partIds: [ids.partId],
    fromLegId: null,
    toLegId: null,
  });
  await manager.insert(HandoffOffer, {
    id: ids.offerId,
    handoffId: ids.handoffId,
    byPartyId: lead.partyId,
    byAccountId: lead.person.id,
    onDay: '2027-03-01',
  });
  const threadId = await makeThread(app, kit, 'named', [party.partyId]);
  const target = {
    ...ids,
    commissionId,
    threadId,
    shopId: party.shopId ?? '',
    accountId: party.person.id,
    invitedByAccountId: lead.person.id,
    partyId: party.partyId,
    leadPartyId: lead.partyId,
    leadShopId: lead.shopId ?? '',
  };
  await putConsumables(app, target);
  return target;
}

/** Two commissions, everyone who could ask, and a full set of records for each target. */
export async function makeAuthorizationWorld(app: TestApp): Promise<AuthorizationWorld> {
  const { manager } = app.services.db;
  const kit = await makeCommissionKit(app);
  const elsewhere = await makeCommissionKit(app);
  const bookkeeper = await makeMember(app, { id: kit.lead.shopId ?? '' }, 'bookkeeper');
  const leadHand = await makeMember(app, { id: kit.lead.shopId ?? '' }, 'hand');
  const makerHand = await makeMember(app, { id: kit.maker.shopId ?? '' }, 'hand');
  const guest = await makeAccount(app);
  const expiredGuest = await makeAccount(app);
  await manager.insert(Party, {
    commissionId: kit.commissionId,
    roles: ['guest'],
    shopId: null,
    accountId: guest.id,
    guestSees: ['standing', 'pictures'],
    seesUntil: '2099-01-01',
  });
  // A guest whose time is over is nobody here, as the removed party is.
  await manager.insert(Party, {
    commissionId: kit.commissionId,
    roles: ['guest'],
    shopId: null,
    accountId: expiredGuest.id,
    guestSees: ['standing'],
    seesUntil: '2020-01-01',
  });
  const removedShop = await makeShop(app);
  const removedPerson = await makeMember(app, removedShop);
  await manager.insert(Party, {
    commissionId: kit.commissionId,
    roles: ['maker'],
    shopId: removedShop.id,
    accountId: null,
    leftAt: new Date(),
  });
  const steward = await makeAccount(app, { isSteward: true });
  await refreshCommissionNames(manager, kit.commissionId);
  const people = {
    lead: kit.lead.person,
    leadHand,
    bookkeeper,
    maker: kit.maker.person,
    makerHand,
    finisher: kit.finisher.person,
    client: kit.client.person,
    guest,
    removed: removedPerson,
    expiredGuest,
    outsider: elsewhere.lead.person,
    steward,
  };
  const clients: AuthorizationWorld['clients'] = {
    anonymous: new TestClient(app),
    lead: kit.lead.client,
    leadHand: await signedInAs(app, leadHand),
    bookkeeper: await signedInAs(app, bookkeeper),
    maker: kit.maker.client,
    makerHand: await signedInAs(app, makerHand),
    finisher: kit.finisher.client,
    client: kit.client.client,
    guest: await signedInAs(app, guest),
    removed: await signedInAs(app, removedPerson),
    expiredGuest: await signedInAs(app, expiredGuest),
    outsider: elsewhere.lead.client,
    steward: await signedInAs(app, steward),
  };
  const missing = Object.fromEntries(
    Object.keys(await makeTarget(app, elsewhere, elsewhere.finisher)).map((key) => [key, randomUUID()]),
  ) as unknown as Target;
  // A record that is not there, asked for in a commission that is.
  const targets = {
    own: await makeTarget(app, kit, kit.maker),
    other: await makeTarget(app, kit, kit.finisher),
    foreign: await makeTarget(app, elsewhere, elsewhere.maker),
    missing: {
      ...missing,
      commissionId: kit.commissionId,
      leadPartyId: kit.lead.partyId,
      leadShopId: kit.lead.shopId ?? '',
    },
  };
  await manager.insert(Commission, { code: encodeCode(numbers++), title: 'Nobody has a part in this one' });
  return {
    clients,
    targets,
    freshClient: (role) => {
      return role === 'anonymous' ? Promise.resolve(clients[role]) : signedInAs(app, people[role]);
    },
  };
}
