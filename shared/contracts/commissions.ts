import { z } from 'zod';
import {
  amountMinor,
  emailAddress,
  inCommission,
  instant,
  isoDay,
  line,
  optionalProse,
  page,
  pageQuery,
  revision,
  uuid,
} from './common.ts';
import { defineRoute, nothing } from './route.ts';
import {
  COMMISSION_STATES,
  CURRENCIES,
  GUEST_SIGHTS,
  PARTY_ROLES,
  SHOP_PARTY_ROLES,
  SHOP_ROLES,
  SHOP_TINTS,
} from './vocabulary.ts';

const budgetMinor = amountMinor.max(1_000_000_000, 'That is more than one commission can be');

/** What the signed-in person is in this commission; the browser builds its ability from it. */
export const membershipView = z.object({
  commissionId: uuid,
  partyId: uuid,
  roles: z.array(z.enum(PARTY_ROLES)),
  shopId: uuid.nullable(),
  shopRole: z.enum(SHOP_ROLES).nullable(),
  guestSees: z.array(z.enum(GUEST_SIGHTS)),
});

export const commissionView = z.object({
  id: uuid,
  code: z.string(),
  title: z.string(),
  state: z.enum(COMMISSION_STATES),
  leadName: z.string(),
  clientName: z.string().nullable(),
  dateWanted: isoDay.nullable(),
  coverFileId: uuid.nullable(),
  revision: z.int(),
  createdAt: instant,
  updatedAt: instant,
  /** The brief and the budget are the lead's and the client's; makers see the brief, never the budget. */
  brief: z.string().optional(),
  budgetMinor: z.int().nullable().optional(),
  currency: z.enum(CURRENCIES).optional(),
  memberships: z.array(membershipView),
});
export type CommissionView = z.infer<typeof commissionView>;

/** A row of the commissions table. */
export const commissionRow = z.object({
  id: uuid,
  code: z.string(),
  title: z.string(),
  state: z.enum(COMMISSION_STATES),
  leadName: z.string(),
  clientName: z.string().nullable(),
  yourRoles: z.array(z.enum(PARTY_ROLES)),
  dateWanted: isoDay.nullable(),
  coverFileId: uuid.nullable(),
  /** Legs held by an open blocking report. */
  heldLegs: z.int(),
  updatedAt: instant,
});
export type CommissionRow = z.infer<typeof commissionRow>;

export const listCommissions = defineRoute({
  method: 'GET',
  path: '/commissions',
  status: 200,
  access: 'signed-in',
  summary: 'Commissions you have a part in, latest change first',
  params: nothing,
  query: pageQuery.extend({
    search: z.string().trim().max(100).optional(),
    state: z.enum(COMMISSION_STATES).optional(),
  }),
  body: nothing,
  response: page(commissionRow),
  problems: [],
});

const commissionFields = {
  title: line(120),
  brief: optionalProse(8000),
  dateWanted: isoDay.nullable(),
  budgetMinor: budgetMinor.nullable(),
  currency: z.enum(CURRENCIES),
};

export const createCommission = defineRoute({
  method: 'POST',
  path: '/commissions',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Open a commission with one of your shops as its lead',
  params: nothing,
  query: nothing,
  body: z.object({
    leadShopId: uuid,
    ...commissionFields,
    alsoRoles: z
      .array(z.enum(['maker', 'finisher', 'installer']))
      .max(3)
      .default([]),
  }),
  response: commissionView,
  problems: ['not-permitted'],
});

export const getCommission = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId',
  status: 200,
  access: 'signed-in',
  summary: 'One commission',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: commissionView,
  problems: ['not-found'],
});

export const updateCommission = defineRoute({
  method: 'PATCH',
  path: '/commissions/:commissionId',
  status: 200,
  access: 'signed-in',
  summary: 'Change a commission (lead)',
  params: inCommission,
  query: nothing,
  body: z.object({
    revision,
    title: commissionFields.title.optional(),
    brief: commissionFields.brief.optional(),
    dateWanted: commissionFields.dateWanted.optional(),
    budgetMinor: commissionFields.budgetMinor.optional(),
    currency: commissionFields.currency.optional(),
    state: z.enum(COMMISSION_STATES).optional(),
    coverFileId: uuid.nullable().optional(),
  }),
  response: commissionView,
  problems: ['not-found', 'not-permitted', 'stale-revision'],
});

export const partyView = z.object({
  id: uuid,
  roles: z.array(z.enum(PARTY_ROLES)),
  displayName: z.string(),
  shopId: uuid.nullable(),
  tint: z.enum(SHOP_TINTS).nullable(),
  /** The people who speak for this party, for mentions; bookkeepers are left out. */
  people: z.array(z.object({ accountId: uuid, displayName: z.string() })),
  seesUntil: isoDay.nullable(),
  joinedAt: instant,
});
export type PartyView = z.infer<typeof partyView>;

export const commissionInvitationView = z.object({
  id: uuid,
  email: z.string(),
  roles: z.array(z.enum(PARTY_ROLES)),
  invitedAt: instant,
  expiresAt: instant,
});

export const listParties = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/parties',
  status: 200,
  access: 'signed-in',
  summary: 'Who takes part, and open invitations (the latter for the lead)',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.object({ parties: z.array(partyView), invitations: z.array(commissionInvitationView) }),
  problems: ['not-found', 'not-permitted'],
});

export const inviteParty = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/invitations',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Invite a shop, the client or a guest by e-mail link (lead)',
  params: inCommission,
  query: nothing,
  body: z.discriminatedUnion('kind', [
    z.object({
      kind: z.literal('shop'),
      email: emailAddress,
      roles: z.array(z.enum(SHOP_PARTY_ROLES).exclude(['lead'])).min(1, 'Choose at least one kind of work'),
    }),
    z.object({ kind: z.literal('client'), email: emailAddress }),
    z.object({
      kind: z.literal('guest'),
      email: emailAddress,
      sees: z
        .array(z.enum(GUEST_SIGHTS))
        .refine((sees) => sees.includes('standing'), 'Where the piece stands is seen by every guest'),
      seesUntil: isoDay,
    }),
  ]),
  response: commissionInvitationView,
  problems: ['not-found', 'not-permitted', 'already-there', 'too-many-tries'],
});

export const withdrawInvitation = defineRoute({
  method: 'DELETE',
  path: '/commissions/:commissionId/invitations/:invitationId',
  status: 204,
  access: 'signed-in',
  summary: 'Take an invitation back (lead)',
  params: inCommission.extend({ invitationId: uuid }),
  query: nothing,
  body: nothing,
  response: nothing,
  problems: ['not-found', 'not-permitted'],
});

export const removeParty = defineRoute({
  method: 'DELETE',
  path: '/commissions/:commissionId/parties/:partyId',
  status: 204,
  access: 'signed-in',
  summary: 'Take a party out of the commission; it loses sight at once (lead)',
  params: inCommission.extend({ partyId: uuid }),
  query: nothing,
  body: nothing,
  response: nothing,
  problems: ['not-found', 'not-permitted', 'not-in-this-state'],
});
