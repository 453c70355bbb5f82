import { z } from 'zod';
import { figure, inCommission, instant, isoDay, optionalProse, prose, revision, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { OFFER_STATES } from './vocabulary.ts';

const inHandoff = inCommission.extend({ handoffId: uuid });

export const handoffOfferView = z.object({
  id: uuid,
  byPartyId: uuid,
  byName: z.string(),
  onDay: isoDay,
  words: z.string(),
  state: z.enum(OFFER_STATES),
  at: instant,
  answeredBy: z.string().nullable(),
  answeredAt: instant.nullable(),
  reason: z.string(),
});
export type HandoffOfferView = z.infer<typeof handoffOfferView>;

export const handoffView = z.object({
  id: uuid,
  fromPartyId: uuid,
  toPartyId: uuid,
  partIds: z.array(uuid),
  fromLegId: uuid.nullable(),
  toLegId: uuid.nullable(),
  /** Working days on the way. */
  transitDays: z.number(),
  carriage: z.string(),
  agreedOn: isoDay.nullable(),
  doneOn: isoDay.nullable(),
  revision: z.int(),
  /** The offer that stands, and those before it: for the two sides and the lead. */
  offers: z.array(handoffOfferView).optional(),
});
export type HandoffView = z.infer<typeof handoffView>;

export const listHandoffs = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/handoffs',
  status: 200,
  access: 'signed-in',
  summary: 'Handoffs with their agreed days',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.array(handoffView),
  problems: ['not-found'],
});

export const getHandoff = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/handoffs/:handoffId',
  status: 200,
  access: 'signed-in',
  summary: 'One handoff',
  params: inHandoff,
  query: nothing,
  body: nothing,
  response: handoffView,
  problems: ['not-found'],
});

export const createHandoff = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/handoffs',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Plan a handoff between two parties (lead, or one of the two)',
  params: inCommission,
  query: nothing,
  body: z
    .object({
      fromPartyId: uuid,
      toPartyId: uuid,
      partIds: z.array(uuid).min(1, 'Choose at least one part').max(50),
      fromLegId: uuid.nullable(),
      toLegId: uuid.nullable(),
      transitDays: figure.min(0, 'Give 0 or more').max(120, 'Give at most 120 days'),
      carriage: optionalProse(120),
    })
    .refine((handoff) => handoff.fromPartyId !== handoff.toPartyId, {
      error: 'A handoff is between two parties',
      path: ['toPartyId'],
    }),
  response: handoffView,
  problems: ['not-found', 'not-permitted'],
});

/** What a day would do to the client's date, shown before anyone agrees; `null` where no plan can be computed. */
export const dayEffectView = z.object({
  onDay: isoDay,
  before: z.object({ fromDay: isoDay, toDay: isoDay }).nullable(),
  after: z.object({ fromDay: isoDay, toDay: isoDay }).nullable(),
  movedDays: z.int().nullable(),
  words: z.string(),
});
export type DayEffectView = z.infer<typeof dayEffectView>;

export const previewHandoffDay = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/handoffs/:handoffId/effect',
  status: 200,
  access: 'signed-in',
  summary: "What a day for this handoff does to the client's date",
  params: inHandoff,
  query: z.object({ onDay: isoDay }),
  body: nothing,
  response: dayEffectView,
  problems: ['not-found', 'not-permitted'],
});

const act = { method: 'POST', access: 'signed-in', status: 200, query: nothing, response: handoffView } as const;
const inOffer = inHandoff.extend({ offerId: uuid });
const actProblems = ['not-found', 'not-permitted', 'stale-revision', 'not-in-this-state'] as const;

export const offerHandoffDay = defineRoute({
  ...act,
  path: '/commissions/:commissionId/handoffs/:handoffId/offers',
  status: 201,
  keyed: true,
  params: inHandoff,
  summary: 'Offer a day, or counter the one that stands',
  body: z.object({ revision, onDay: isoDay, words: optionalProse(1000) }),
  problems: actProblems,
});

export const acceptHandoffDay = defineRoute({
  ...act,
  path: '/commissions/:commissionId/handoffs/:handoffId/offers/:offerId/acceptance',
  params: inOffer,
  summary: 'Accept the day that the other side offers',
  body: z.object({ revision }),
  problems: actProblems,
});

export const declineHandoffDay = defineRoute({
  ...act,
  path: '/commissions/:commissionId/handoffs/:handoffId/offers/:offerId/refusal',
  params: inOffer,
  summary: 'Decline the offered day with a reason',
  body: z.object({ revision, reason: prose(1000) }),
  problems: actProblems,
});

export const withdrawHandoffDay = defineRoute({
  ...act,
  path: '/commissions/:commissionId/handoffs/:handoffId/offers/:offerId/withdrawal',
  params: inOffer,
  summary: 'Take your own offer back',
  body: z.object({ revision }),
  problems: actProblems,
});

export const completeHandoff = defineRoute({
  ...act,
  path: '/commissions/:commissionId/handoffs/:handoffId/completion',
  params: inHandoff,
  summary: 'Say the parts have arrived; they are yours from that day (receiver)',
  body: z.object({ revision, onDay: isoDay, words: optionalProse(1000) }),
  problems: actProblems,
});

export const dropHandoff = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/handoffs/:handoffId/drop',
  status: 204,
  access: 'signed-in',
  summary: 'Take a handoff that will not come about out of the plan, with the reason (lead)',
  params: inHandoff,
  query: nothing,
  body: z.object({ revision, words: prose(1000) }),
  response: nothing,
  problems: actProblems,
});
