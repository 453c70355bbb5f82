import { z } from 'zod';
import { figure, inCommission, isoDay, line, optionalProse, revision, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { LEG_KINDS, LEG_STATES, PART_KINDS } from './vocabulary.ts';

export const partView = z.object({
  id: uuid,
  name: z.string(),
  kind: z.enum(PART_KINDS),
  holderPartyId: uuid,
  holderSince: isoDay,
  position: z.int(),
  revision: z.int(),
});
export type PartView = z.infer<typeof partView>;

export const listParts = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/parts',
  status: 200,
  access: 'signed-in',
  summary: 'Physical parts and who holds each',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.array(partView),
  problems: ['not-found', 'not-permitted'],
});

export const createPart = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/parts',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Add a part (lead)',
  params: inCommission,
  query: nothing,
  body: z.object({ name: line(80), kind: z.enum(PART_KINDS), holderPartyId: uuid }),
  response: partView,
  problems: ['not-found', 'not-permitted'],
});

export const updatePart = defineRoute({
  method: 'PATCH',
  path: '/commissions/:commissionId/parts/:partId',
  status: 200,
  access: 'signed-in',
  summary: 'Rename a part or correct its holder (lead)',
  params: inCommission.extend({ partId: uuid }),
  query: nothing,
  body: z.object({
    revision,
    name: line(80).optional(),
    kind: z.enum(PART_KINDS).optional(),
    holderPartyId: uuid.optional(),
  }),
  response: partView,
  problems: ['not-found', 'not-permitted', 'stale-revision'],
});

/** Working days, Monday to Friday. */
const workingDays = figure.min(0, 'Give a number of days, 0 or more').max(400, 'Give at most 400 days');

export const legView = z.object({
  id: uuid,
  partyId: uuid,
  partId: uuid,
  kind: z.enum(LEG_KINDS),
  title: z.string(),
  state: z.enum(LEG_STATES),
  plannedStartOn: isoDay.nullable(),
  startedOn: isoDay.nullable(),
  finishedOn: isoDay.nullable(),
  afterLegIds: z.array(uuid),
  position: z.int(),
  revision: z.int(),
  /** Set while an open blocking report holds this leg; the report's title only for those who may read it. */
  held: z.object({ sinceDay: isoDay, reportId: uuid.optional(), title: z.string().optional() }).nullable(),
  /** Three estimates in working days: the lead's and the leg's own shop's to see. */
  hopefulDays: z.number().optional(),
  likelyDays: z.number().optional(),
  badDays: z.number().optional(),
  /** Seen by the leg's own shop alone. */
  privateNote: z.string().optional(),
});
export type LegView = z.infer<typeof legView>;

export const listLegs = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/legs',
  status: 200,
  access: 'signed-in',
  summary: 'Legs in their order',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.array(legView),
  problems: ['not-found'],
});

const estimates = { hopefulDays: workingDays, likelyDays: workingDays, badDays: workingDays };
const inOrder = (days: {
  hopefulDays?: number | undefined;
  likelyDays?: number | undefined;
  badDays?: number | undefined;
}) => (days.hopefulDays ?? 0) <= (days.likelyDays ?? Infinity) && (days.likelyDays ?? 0) <= (days.badDays ?? Infinity);
const orderMessage = {
  error: 'Hopeful cannot be longer than likely, nor likely longer than bad',
  path: ['likelyDays'],
};

export const createLeg = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/legs',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Add a leg (lead)',
  params: inCommission,
  query: nothing,
  body: z
    .object({
      partyId: uuid,
      partId: uuid,
      kind: z.enum(LEG_KINDS),
      title: line(80),
      ...estimates,
      plannedStartOn: isoDay.nullable(),
      afterLegIds: z.array(uuid).max(50),
    })
    .refine(inOrder, orderMessage),
  response: legView,
  problems: ['not-found', 'not-permitted'],
});

export const updateLeg = defineRoute({
  method: 'PATCH',
  path: '/commissions/:commissionId/legs/:legId',
  status: 200,
  access: 'signed-in',
  summary: 'Change a leg (lead: everything but the private note; its shop: estimates, start and private note)',
  params: inCommission.extend({ legId: uuid }),
  query: nothing,
  body: z
    .object({
      revision,
      partyId: uuid.optional(),
      partId: uuid.optional(),
      kind: z.enum(LEG_KINDS).optional(),
      title: line(80).optional(),
      hopefulDays: workingDays.optional(),
      likelyDays: workingDays.optional(),
      badDays: workingDays.optional(),
      plannedStartOn: isoDay.nullable().optional(),
      afterLegIds: z.array(uuid).max(50).optional(),
      privateNote: optionalProse(2000).optional(),
    })
    .refine(inOrder, orderMessage),
  response: legView,
  problems: ['not-found', 'not-permitted', 'stale-revision'],
});

export const moveLeg = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/legs/:legId/progress',
  status: 200,
  access: 'signed-in',
  summary: "Start, finish, reopen or drop a leg (its shop; dropping is the lead's)",
  params: inCommission.extend({ legId: uuid }),
  query: nothing,
  body: z.object({ revision, state: z.enum(LEG_STATES), onDay: isoDay, early: z.boolean().default(false) }),
  response: legView,
  problems: ['not-found', 'not-permitted', 'stale-revision', 'not-in-this-state'],
});
