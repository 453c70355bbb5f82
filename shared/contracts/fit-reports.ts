import { z } from 'zod';
import { amountMinor, figure, inCommission, instant, line, optionalProse, prose, revision, uuid } from './common.ts';
import { defineRoute, nothing } from './route.ts';
import { CONSENT_STATES, CURRENCIES, JOINT_SIDES, NOTE_STATES, REPORT_STATES } from './vocabulary.ts';

const inReport = inCommission.extend({ reportId: uuid });

export const reworkNoteView = z.object({
  id: uuid,
  partyId: uuid,
  authorName: z.string(),
  at: instant,
  state: z.enum(NOTE_STATES),
  method: z.string(),
  cutSide: z.enum(JOINT_SIDES),
  /** What comes off on diameter, um. */
  removeOnDiameterUm: z.number(),
  overLengthMm: z.number().nullable(),
  risk: z.string(),
  shows: z.boolean(),
  whereItShows: z.string(),
  costMinor: z.int(),
  currency: z.enum(CURRENCIES),
  costBorneByPartyId: uuid.nullable(),
  effectDays: z.number(),
  /** Present when the rework shows: the client is asked before work may start. */
  consent: z.object({ state: z.enum(CONSENT_STATES), at: instant.nullable(), words: z.string() }).nullable(),
});
export type ReworkNoteView = z.infer<typeof reworkNoteView>;

export const reportEventView = z.object({
  id: uuid,
  act: z.string(),
  fromState: z.enum(REPORT_STATES).nullable(),
  toState: z.enum(REPORT_STATES),
  by: z.string(),
  at: instant,
  words: z.string(),
});

export const fitReportView = z.object({
  id: uuid,
  jointId: uuid,
  title: z.string(),
  plainWords: z.string(),
  state: z.enum(REPORT_STATES),
  blocking: z.boolean(),
  heldLegId: uuid.nullable(),
  raisedByPartyId: uuid,
  raisedByName: z.string(),
  answerPartyId: uuid,
  raisedAt: instant,
  reopenedCount: z.int(),
  /** What the client is told; the lead's to write. */
  clientWords: z.string(),
  revision: z.int(),
});
export type FitReportView = z.infer<typeof fitReportView>;

export const fitReportDetail = z.object({
  report: fitReportView,
  notes: z.array(reworkNoteView),
  events: z.array(reportEventView),
});
export type FitReportDetail = z.infer<typeof fitReportDetail>;

export const listFitReports = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/fit-reports',
  status: 200,
  access: 'signed-in',
  summary: 'Fit reports you raised or answer; all of them for the lead',
  params: inCommission,
  query: z.object({ open: z.enum(['yes', 'no']).optional() }),
  body: nothing,
  response: z.array(fitReportView),
  problems: ['not-found'],
});

export const getFitReport = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/fit-reports/:reportId',
  status: 200,
  access: 'signed-in',
  summary: 'One fit report with its notes and history',
  params: inReport,
  query: nothing,
  body: nothing,
  response: fitReportDetail,
  problems: ['not-found'],
});

export const raiseFitReport = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/fit-reports',
  status: 201,
  access: 'signed-in',
  keyed: true,
  summary: 'Say that a joint does not go together as agreed',
  params: inCommission,
  query: nothing,
  body: z.object({
    jointId: uuid,
    title: line(120),
    plainWords: optionalProse(4000),
    blocking: z.boolean(),
    heldLegId: uuid.nullable(),
    /** The party that answers; by default the other party of the joint. */
    answerPartyId: uuid.optional(),
  }),
  response: fitReportDetail,
  problems: ['not-found', 'not-permitted', 'already-there'],
});

const reportAct = {
  method: 'POST',
  status: 200,
  access: 'signed-in',
  params: inReport,
  query: nothing,
  response: fitReportDetail,
} as const;
const actProblems = ['not-found', 'not-permitted', 'stale-revision', 'not-in-this-state'] as const;

export const answerFitReport = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/answers',
  keyed: true,
  summary: 'Answer with a rework note (the party that answers for the joint)',
  body: z
    .object({
      revision,
      method: prose(4000),
      cutSide: z.enum(JOINT_SIDES),
      removeOnDiameterUm: figure.min(0, 'Give 0 or more').max(5000, 'That is more than 5 mm; check the unit'),
      overLengthMm: figure.gt(0, 'Give a length above 0').max(400, 'Give at most 400 mm').nullable(),
      risk: optionalProse(2000),
      shows: z.boolean(),
      whereItShows: optionalProse(500),
      costMinor: amountMinor.max(100_000_000, 'That is more than one rework can be'),
      currency: z.enum(CURRENCIES),
      costBorneByPartyId: uuid.nullable(),
      effectDays: figure.min(0, 'Give 0 or more').max(400, 'Give at most 400 days'),
    })
    .refine((note) => !note.shows || note.whereItShows.length > 0, {
      error: 'Say where it will show',
      path: ['whereItShows'],
    }),
  problems: actProblems,
});

export const agreeToRework = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/agreement',
  summary: 'Agree to the rework note (the party that raised the report)',
  body: z.object({ revision, noteId: uuid }),
  problems: actProblems,
});

export const askOtherLimits = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/other-limits',
  summary: 'Ask for another answer, with the reason',
  body: z.object({ revision, noteId: uuid, words: prose(2000) }),
  problems: actProblems,
});

export const startRework = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/rework-start',
  summary: "Begin the rework; what shows needs the client's consent first",
  body: z.object({ revision }),
  problems: actProblems,
});

export const finishRework = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/rework-completion',
  summary: 'Say the rework is done; the other party verifies',
  body: z.object({ revision, words: optionalProse(2000) }),
  problems: actProblems,
});

export const verifyRework = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/verification',
  summary: 'Verify by fresh readings: closes the report, or reopens it',
  body: z.object({ revision, passed: z.boolean(), words: optionalProse(2000) }),
  problems: actProblems,
});

export const withdrawFitReport = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/withdrawal',
  summary: 'Take the report back',
  body: z.object({ revision, words: prose(2000) }),
  problems: actProblems,
});

export const writeClientWords = defineRoute({
  ...reportAct,
  path: '/commissions/:commissionId/fit-reports/:reportId/client-words',
  summary: 'What the client reads of this report (lead)',
  body: z.object({ revision, clientWords: line(200) }),
  problems: ['not-found', 'not-permitted', 'stale-revision'],
});

/** What a client is asked: never a shop's price, never the makers' words. */
export const consentView = z.object({
  noteId: uuid,
  reportId: uuid,
  pieceTitle: z.string(),
  askedBy: z.string(),
  askedAt: instant,
  whatIsDone: z.string(),
  whereItShows: z.string(),
  state: z.enum(CONSENT_STATES),
  answeredAt: instant.nullable(),
  words: z.string(),
  beforeFileIds: z.array(uuid),
});
export type ConsentView = z.infer<typeof consentView>;

export const listConsents = defineRoute({
  method: 'GET',
  path: '/commissions/:commissionId/consents',
  status: 200,
  access: 'signed-in',
  summary: 'Consents asked of the client',
  params: inCommission,
  query: nothing,
  body: nothing,
  response: z.array(consentView),
  problems: ['not-found', 'not-permitted'],
});

export const answerConsent = defineRoute({
  method: 'POST',
  path: '/commissions/:commissionId/consents/:noteId',
  status: 200,
  access: 'signed-in',
  summary: 'Give or refuse consent to a rework that shows (client)',
  params: inCommission.extend({ noteId: uuid }),
  query: nothing,
  body: z.object({ given: z.boolean(), words: optionalProse(2000) }),
  response: consentView,
  problems: ['not-found', 'not-permitted', 'not-in-this-state'],
});
