import { randomUUID } from 'node:crypto';
import type { Target } from './authorization-world.ts';

/** A stale revision: whoever may act is told of the conflict and nothing changes between two cells of the table. */
const STALE = 999;

/**
 * The body of each route that needs one, valid by its contract, so that what answers is the authorization and not the
 * check of values. Acts carry a stale revision.
 */
export const BODIES: Readonly<Record<string, (target: Target) => unknown>> = {
  signIn: () => ({ email: 'nobody@x.test', password: 'wrong' }),
  giveSecondFactor: () => ({ code: '000000' }),
  updateMe: () => ({}),
  changePassword: () => ({ currentPassword: 'wrong', newPassword: 'a long enough sentence of words' }),
  confirmSecondFactor: () => ({ code: '000000' }),
  removeSecondFactor: () => ({ password: 'wrong', code: '000000' }),
  askPasswordReset: () => ({ email: 'nobody@x.test' }),
  completePasswordReset: () => ({ token: 'x'.repeat(40), newPassword: 'a long enough sentence of words' }),
  previewInvitation: () => ({ token: 'x'.repeat(40) }),
  acceptInvitation: () => ({ token: 'x'.repeat(40) }),
  createShop: () => ({ name: 'New', craft: 'Hilts', country: 'DE', ownerEmail: `${randomUUID()}@x.test` }),
  updateShop: () => ({ revision: STALE }),
  inviteShopMember: () => ({ email: `${randomUUID()}@x.test`, role: 'hand' }),
  changeShopMember: () => ({ role: 'hand' }),
  createCommission: (target) => ({
    leadShopId: target.leadShopId,
    title: 'New',
    brief: '',
    dateWanted: null,
    budgetMinor: null,
    currency: 'EUR',
  }),
  updateCommission: () => ({ revision: STALE }),
  inviteParty: () => ({ kind: 'client', email: `${randomUUID()}@x.test` }),
  createPart: (target) => ({ name: 'Part', kind: 'hilt', holderPartyId: target.leadPartyId }),
  updatePart: () => ({ revision: STALE }),
  createLeg: (target) => ({
    partyId: target.leadPartyId,
    partId: target.partId,
    kind: 'other',
    title: 'Leg',
    hopefulDays: 1,
    likelyDays: 2,
    badDays: 3,
    plannedStartOn: null,
    afterLegIds: [],
  }),
  updateLeg: () => ({ revision: STALE, likelyDays: 2 }),
  moveLeg: () => ({ revision: STALE, state: 'under-way', onDay: '2027-03-01' }),
  createJoint: (target) => ({
    name: 'Joint',
    kind: 'other',
    holePartId: target.partId,
    shaftPartId: target.otherPartId,
    holePartyId: target.leadPartyId,
    shaftPartyId: target.leadPartyId,
    nominalMm: 30,
    clearanceMinUm: 1,
    clearanceMaxUm: 2,
    holeClass: null,
    shaftClass: null,
    handFit: null,
    engagementMm: null,
    hiddenLengthMm: null,
    note: '',
  }),
  updateJoint: () => ({ revision: STALE }),
  addReadings: () => ({ side: 'hole', resolutionUm: 10, readings: [{ text: '30.01', unit: 'mm' }] }),
  raiseFitReport: (target) => ({
    jointId: target.jointId,
    title: 'Again',
    plainWords: '',
    blocking: false,
    heldLegId: null,
  }),
  answerFitReport: () => ({
    revision: STALE,
    method: 'Turn',
    cutSide: 'shaft',
    removeOnDiameterUm: 1,
    overLengthMm: null,
    risk: '',
    shows: false,
    whereItShows: '',
    costMinor: 0,
    currency: 'EUR',
    costBorneByPartyId: null,
    effectDays: 0,
  }),
  agreeToRework: (target) => ({ revision: STALE, noteId: target.noteId }),
  askOtherLimits: (target) => ({ revision: STALE, noteId: target.noteId, words: 'Less' }),
  startRework: () => ({ revision: STALE }),
  finishRework: () => ({ revision: STALE, words: '' }),
  verifyRework: () => ({ revision: STALE, passed: true, words: '' }),
  withdrawFitReport: () => ({ revision: STALE, words: 'No' }),
  writeClientWords: () => ({ revision: STALE, clientWords: 'Words' }),
  answerConsent: () => ({ given: true, words: '' }),
  createHandoff: (target) => ({
    fromPartyId: target.partyId,
    toPartyId: target.leadPartyId,
    partIds: [target.partId],
    fromLegId: null,
    toLegId: null,
    transitDays: 1,
    carriage: '',
  }),
  offerHandoffDay: () => ({ revision: STALE, onDay: '2027-03-02', words: '' }),
  acceptHandoffDay: () => ({ revision: STALE }),
  declineHandoffDay: () => ({ revision: STALE, reason: 'No' }),
  withdrawHandoffDay: () => ({ revision: STALE }),
  completeHandoff: () => ({ revision: STALE, onDay: '2026-01-01', words: '' }),
  openThread: (target) => ({
    subject: 'commission',
    subjectId: target.commissionId,
    title: 'Thread',
    audience: 'everyone',
  }),
  postMessage: () => ({ id: randomUUID(), body: 'A word' }),
  markThreadRead: () => ({ readSequence: 0 }),
};

export const QUERIES: Readonly<Record<string, (target: Target) => Record<string, string>>> = {
  previewHandoffDay: () => ({ onDay: '2027-03-02' }),
  listFiles: (target) => ({ place: 'thread', placeId: target.threadId }),
};

/** Text fields of an upload into a thread. */
export const uploadFields = (target: Target): Record<string, string> => ({
  id: randomUUID(),
  place: 'thread',
  placeId: target.threadId,
  purpose: 'message',
});
