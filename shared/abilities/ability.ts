import { AbilityBuilder, createMongoAbility, subject, type MongoAbility, type ForcedSubject } from '@casl/ability';
import type { Action } from './actions.ts';
import { memberKeysOf, type Actor, type Membership } from './actor.ts';
import type { SubjectFacts, SubjectName } from './subjects.ts';

type Tagged<N extends SubjectName> = SubjectFacts[N] & ForcedSubject<N>;
export type AppSubject = SubjectName | { [N in SubjectName]: Tagged<N> }[SubjectName];
export type AppAbility = MongoAbility<[Action, AppSubject]>;

type Can = (
  action: Action | Action[],
  subjectName: SubjectName,
  fieldsOrConditions?: unknown,
  conditions?: unknown,
) => unknown;

/** Fields of a leg that its readers always get; estimates and the private note are granted on top. */
export const LEG_FIELDS = {
  plan: [
    'id',
    'partyId',
    'partId',
    'kind',
    'title',
    'state',
    'plannedStartOn',
    'startedOn',
    'finishedOn',
    'afterLegIds',
    'position',
    'revision',
    'held',
  ],
  estimates: ['hopefulDays', 'likelyDays', 'badDays'],
  privateNote: ['privateNote'],
} as const;

export const COMMISSION_FIELDS = {
  heading: [
    'id',
    'code',
    'title',
    'state',
    'leadName',
    'clientName',
    'dateWanted',
    'coverFileId',
    'revision',
    'createdAt',
    'updatedAt',
    'memberships',
  ],
  brief: ['brief'],
  budget: ['budgetMinor', 'currency'],
} as const;

export const HANDOFF_FIELDS = {
  plan: [
    'id',
    'fromPartyId',
    'toPartyId',
    'partIds',
    'fromLegId',
    'toLegId',
    'transitDays',
    'carriage',
    'agreedOn',
    'doneOn',
    'revision',
  ],
  offers: ['offers'],
} as const;

const every = (fields: Record<string, readonly string[]>): string[] => Object.values(fields).flat();

/**
 * The one place that says who may do what. Pure, and run on both sides; only the server's answer counts.
 * Every rule carries the commission in its conditions, so nobody gains sight of one commission through another.
 */
export function abilityFor(actor: Actor): AppAbility {
  const { can, build } = new AbilityBuilder<AppAbility>(createMongoAbility);
  const allow = can as unknown as Can;

  if (actor.isSteward) allow('administer', 'Installation');
  for (const shop of actor.shops) {
    allow('read', 'Shop', { id: shop.shopId });
    if (shop.role === 'owner') allow(['update', 'invite', 'remove'], 'Shop', { id: shop.shopId });
    if (shop.role !== 'bookkeeper') allow('create', 'NewCommission', { leadShopId: shop.shopId });
  }
  allow('read', 'Commission', [...COMMISSION_FIELDS.heading], { memberKeys: { $in: memberKeysOf(actor) } });
  for (const membership of actor.memberships) allowMembership(allow, membership);
  return build();
}

function allowMembership(allow: Can, membership: Membership): void {
  const { commissionId, partyId: mine, roles } = membership;
  const here = { commissionId };
  // A guest's key is kept out of `memberKeys`, since a guest's sight ends by date and not by an act.
  allow('read', 'Commission', [...COMMISSION_FIELDS.heading], { id: commissionId });
  if (membership.shopRole === 'bookkeeper') {
    allow('read', ['Party', 'Standing'] as never, here);
    allow('read', 'Leg', [...LEG_FIELDS.plan], here);
    return;
  }
  if (roles.includes('guest')) return allowGuest(allow, membership);

  allow('read', ['Party', 'Part', 'Standing', 'Pictures'] as never, here);
  allow('picture', 'Commission', { id: commissionId });
  allow(['read', 'post'], 'Thread', { ...here, audience: 'everyone' });
  allow(['read', 'post'], 'Thread', { ...here, partyIds: { $in: [mine] } });
  allow('create', 'Thread', here);
  allow(['read'], 'Handoff', every(HANDOFF_FIELDS), { ...here, fromPartyId: mine });
  allow(['read'], 'Handoff', every(HANDOFF_FIELDS), { ...here, toPartyId: mine });
  allow('offer', 'Handoff', { ...here, fromPartyId: mine });
  allow(['offer', 'receive'], 'Handoff', { ...here, toPartyId: mine });

  if (roles.includes('client')) {
    allow('read', 'Commission', [...COMMISSION_FIELDS.brief, ...COMMISSION_FIELDS.budget], { id: commissionId });
    allow(['read', 'consent'], 'Consent', here);
    return;
  }
  allowShop(allow, commissionId, mine);
  if (roles.includes('lead')) allowLead(allow, commissionId);
}

function allowGuest(allow: Can, { commissionId, guestSees }: Membership): void {
  const here = { commissionId };
  allow('read', 'Standing', here);
  if (guestSees.includes('parts')) allow('read', ['Party', 'Part'] as never, here);
  if (guestSees.includes('pictures')) allow('read', 'Pictures', here);
  if (guestSees.includes('threads')) allow('read', 'Thread', { ...here, audience: 'everyone' });
}

/** A shop with a leg of the work: its own legs and joints, the makers' threads, the plan of all. */
function allowShop(allow: Can, commissionId: string, mine: string): void {
  const here = { commissionId };
  allow('read', 'Commission', [...COMMISSION_FIELDS.brief], { id: commissionId });
  allow('read', 'Leg', [...LEG_FIELDS.plan], here);
  allow('read', 'Leg', every(LEG_FIELDS), { ...here, partyId: mine });
  allow(['update'], 'Leg', [...LEG_FIELDS.estimates, ...LEG_FIELDS.privateNote, 'plannedStartOn'], {
    ...here,
    partyId: mine,
  });
  allow('move', 'Leg', { ...here, partyId: mine });
  for (const side of ['holePartyId', 'shaftPartyId'])
    allow(['read', 'measure', 'raise'], 'Joint', { ...here, [side]: mine });
  allow(['read', 'picture', 'agree', 'verify', 'withdraw'], 'FitReport', { ...here, raisedByPartyId: mine });
  allow(['read', 'picture', 'answer', 'rework'], 'FitReport', { ...here, answerPartyId: mine });
  allow(['read'], 'Handoff', [...HANDOFF_FIELDS.plan], here);
  allow('create', 'Handoff', { ...here, fromPartyId: mine });
  allow('create', 'Handoff', { ...here, toPartyId: mine });
  allow(['read', 'post'], 'Thread', { ...here, audience: 'makers' });
}

/** The shop that holds the client's contract: everything but other shops' private notes and own-shop threads. */
function allowLead(allow: Can, commissionId: string): void {
  const here = { commissionId };
  allow('read', 'Commission', every(COMMISSION_FIELDS), { id: commissionId });
  allow(['update', 'invite', 'remove'], 'Commission', { id: commissionId });
  allow(['create', 'update'], 'Part', here);
  allow('read', 'Leg', [...LEG_FIELDS.plan, ...LEG_FIELDS.estimates], here);
  allow(['create', 'drop'], 'Leg', here);
  allow('update', 'Leg', [...LEG_FIELDS.plan, ...LEG_FIELDS.estimates], here);
  allow(['read', 'create', 'update', 'measure', 'raise'], 'Joint', here);
  allow(['read', 'picture', 'withdraw', 'word'], 'FitReport', here);
  allow('read', 'Consent', here);
  allow(['read'], 'Handoff', every(HANDOFF_FIELDS), here);
  allow(['create', 'drop'], 'Handoff', here);
  allow(['read', 'post'], 'Thread', { ...here, audience: { $in: ['named', 'makers', 'everyone'] } });
}

/** Asks the ability about one record's facts. The facts are copied, since CASL tags the object it is given. */
export const mayDo = <N extends SubjectName>(
  ability: AppAbility,
  action: Action,
  name: N,
  facts: SubjectFacts[N],
  field?: string,
): boolean => ability.can(action, subject(name, { ...facts }) as unknown as AppSubject, field);
