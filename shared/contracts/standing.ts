import { z } from 'zod';
import { inCommission, instant, isoDay, pageQuery, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { COMMISSION_STATES, LEG_KINDS, LEG_STATES, PARTY_ROLES } from './vocabulary.ts';

const dayRange = z.object({ fromDay: isoDay, toDay: isoDay });

/**
 * The facts a client may know, as `shared/engines/standing/client-facts.ts` types them. The page computes the merged status
 * from these with the same function as the server.
 */
export const clientFactsView = z.object({
  pieceTitle: z.string(),
  code: z.string(),
  clientName: z.string().nullable(),
  parts: z.array(z.object({ id: uuid, name: z.string(), holderName: z.string(), sinceDay: isoDay.nullable() })),
  legs: z.array(
    z.object({
      id: uuid,
      kind: z.enum(LEG_KINDS),
      title: z.string(),
      shopName: z.string(),
      shopCraft: z.string(),
      partId: uuid,
      state: z.enum(LEG_STATES),
      startedOn: isoDay.nullable(),
      finishedOn: isoDay.nullable(),
      plannedStartOn: isoDay.nullable(),
      plannedFinishOn: isoDay.nullable(),
      held: z
        .object({
          sinceDay: isoDay,
          clientWords: z.string(),
          consentAsked: z.boolean(),
          willShow: z.boolean().nullable(),
        })
        .nullable(),
    }),
  ),
  handoffs: z.array(
    z.object({
      id: uuid,
      partIds: z.array(uuid),
      fromName: z.string(),
      toName: z.string(),
      agreedOn: isoDay.nullable(),
      doneOn: isoDay.nullable(),
    }),
  ),
  waitingOnClient: z.array(
    z.object({ kind: z.enum(['consent', 'handoff-day']), refId: uuid, words: z.string(), sinceDay: isoDay }),
  ),
  waitingOnOthers: z.array(z.object({ who: z.string(), forWhat: z.string() })),
  expected: dayRange.extend({ previousFromDay: isoDay.nullable(), previousToDay: isoDay.nullable() }).nullable(),
  deliveredOn: isoDay.nullable(),
});

export const getStanding = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/standing',
  status: 200,
  access: 'signed-in',
  summary: 'Facts behind the merged status: only what the client may know, for every reader alike',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.object({ todayIso: isoDay, facts: clientFactsView }),
  problems: ['not-found', 'not-permitted'],
});

export const benchItemView = z.object({
  /** What it is, so that the page can offer the act in place. */
  kind: z.enum([
    'answer-report',
    'agree-rework',
    'start-rework',
    'finish-rework',
    'verify-rework',
    'consent',
    'answer-offer',
    'offer-day',
    'receive-parts',
    'start-leg',
    'finish-leg',
    'read-mention',
  ]),
  commissionId: uuid,
  commissionTitle: z.string(),
  commissionCode: z.string(),
  coverFileId: uuid.nullable(),
  refId: uuid,
  refRevision: z.int().nullable(),
  offerId: uuid.nullable(),
  noteId: uuid.nullable(),
  words: z.string(),
  day: isoDay.nullable(),
  /** How many legs this holds up, for the order of the list. */
  holdsUp: z.int(),
  whoName: z.string().nullable(),
});
export type BenchItemView = z.infer<typeof benchItemView>;

export const movedView = z.object({
  id: z.string(),
  commissionId: uuid,
  commissionTitle: z.string(),
  words: z.string(),
  by: z.string(),
  at: instant,
  subject: z.string(),
  subjectId: uuid,
});
export type MovedView = z.infer<typeof movedView>;

export const getBench = defineRoute({
  method: 'GET',
  path: '/bench',
  status: 200,
  access: 'signed-in',
  summary: 'What waits on your hands, what you wait on, what moved since you were last here',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.object({
    waitsOnYou: z.array(benchItemView),
    youWaitOn: z.array(benchItemView),
    moved: z.array(movedView),
    lastHereAt: instant.nullable(),
    unreadThreads: z.int(),
    /** The newest of them. */
    unread: z.array(
      z.object({
        threadId: uuid,
        commissionId: uuid,
        commissionTitle: z.string(),
        title: z.string(),
        messages: z.int(),
      }),
    ),
    /** Open commissions of which the reader is the client, or at which they look on as a guest. */
    yourPieces: z.array(
      z.object({
        commissionId: uuid,
        title: z.string(),
        code: z.string(),
        leadName: z.string(),
        state: z.enum(COMMISSION_STATES),
      }),
    ),
    roles: z.array(z.enum(PARTY_ROLES)),
  }),
  problems: [],
});

export const markBenchSeen = defineRoute({
  method: 'POST',
  path: '/bench/mark',
  status: 204,
  access: 'signed-in',
  summary: 'You have seen what moved',
  params: nothing,
  query: nothing,
  body: nothing,
  response: nothing,
  problems: [],
});

export const listMoved = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/history',
  status: 200,
  access: 'signed-in',
  summary: 'What happened in a commission, newest first, as far as you may see it',
  params: inCommission,
  query: pageQuery,
  body: nothing,
  response: z.object({ items: z.array(movedView), nextCursor: z.string().nullable() }),
  problems: ['not-found'],
});
