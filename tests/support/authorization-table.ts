/**
 * What each route answers to each role, written from the product's roles and not from the code. One letter a role, in the
 * order of `ROLES`: anonymous, lead, bookkeeper (of the lead's shop), maker, finisher, client, guest (standing and pictures),
 * removed, outsider (lead of the other commission), steward.
 *
 * `Y` may act (the answer is a success, or a conflict that only one who may act is told of), `N` 403, `0` 404, `-` 401.
 * Rows stand for the targets own (the maker's), other (the finisher's), foreign (the other commission's), missing.
 */
export interface OutcomeRows {
  own: string;
  other: string;
  foreign: string;
  missing: string;
}

const NOBODY = '-000000000';
/** For the lead of the other commission alone. */
const THEIRS = '-0000000Y0';

/** A route without a record in its path: the commission itself is what is asked for. */
const commission = (here: string, foreign = THEIRS): OutcomeRows => ({
  own: here,
  other: here,
  foreign,
  missing: here,
});
const record = (own: string, other: string, foreign = THEIRS, missing = NOBODY): OutcomeRows => ({
  own,
  other,
  foreign,
  missing,
});
const same = (row: string): OutcomeRows => ({ own: row, other: row, foreign: row, missing: row });

const EVERY_PERSON = same('-YYYYYYYYY');
const ANYONE = same('YYYYYYYYYY');
/** Refused as wrong credentials, whoever asks. */
const WRONG = same('----------');

const ALL_HERE = commission('-YYYYYY000');
const LEAD_ACT = commission('-YNNNNN000');
const SHOPS_OWN = record('-00Y000000', '-000Y00000', NOBODY);
/** The lead, and the party itself. */
const BOTH_SIDES = record('-Y0Y000000', '-Y00Y00000');
/** The lead acts on it, the party only sees it. */
const LEADS_SIDE = record('-Y0N000000', '-Y00N00000');
/** The party acts on it, the lead only sees it. */
const PARTYS_SIDE = record('-N0Y000000', '-N00Y00000', '-0000000N0');
/** A handoff's two sides; other shops see its plan. */
const HANDOFF_SIDES = record('-Y0YN00000', '-Y0NY00000');

export const OUTCOMES: Readonly<Record<string, OutcomeRows>> = {
  signIn: WRONG,
  giveSecondFactor: WRONG,
  signOut: EVERY_PERSON,
  signOutEverywhere: EVERY_PERSON,
  getMe: EVERY_PERSON,
  updateMe: EVERY_PERSON,
  changePassword: WRONG,
  beginSecondFactor: EVERY_PERSON,
  confirmSecondFactor: WRONG,
  removeSecondFactor: EVERY_PERSON,
  askPasswordReset: ANYONE,
  completePasswordReset: ANYONE,
  previewInvitation: ANYONE,
  acceptInvitation: ANYONE,

  listShops: same('-NNNNNNNNY'),
  createShop: same('-NNNNNNNNY'),
  getShop: SHOPS_OWN,
  updateShop: SHOPS_OWN,
  listShopMembers: SHOPS_OWN,
  inviteShopMember: SHOPS_OWN,
  withdrawShopInvitation: SHOPS_OWN,
  changeShopMember: SHOPS_OWN,
  removeShopMember: SHOPS_OWN,

  listCommissions: EVERY_PERSON,
  createCommission: commission('-YNNNNNNNN', '-NNNNNNNYN'),
  getCommission: ALL_HERE,
  updateCommission: LEAD_ACT,
  listParties: commission('-YYYYYN000'),
  inviteParty: LEAD_ACT,
  withdrawInvitation: record('-YNNNNN000', '-YNNNNN000', THEIRS, '-0NNNNN000'),
  removeParty: record('-YNNNNN000', '-YNNNNN000', THEIRS, '-0NNNNN000'),

  listParts: commission('-YNYYYN000'),
  createPart: LEAD_ACT,
  updatePart: record('-Y0NNN0000', '-Y0NNN0000'),
  listLegs: ALL_HERE,
  createLeg: LEAD_ACT,
  updateLeg: record('-YNYN00000', '-YNNY00000'),
  moveLeg: record('-NNYN00000', '-NNNY00000', '-0000000N0'),

  listJoints: ALL_HERE,
  getJoint: BOTH_SIDES,
  createJoint: LEAD_ACT,
  updateJoint: LEADS_SIDE,
  addReadings: BOTH_SIDES,

  listFitReports: ALL_HERE,
  getFitReport: BOTH_SIDES,
  raiseFitReport: BOTH_SIDES,
  answerFitReport: LEADS_SIDE,
  agreeToRework: PARTYS_SIDE,
  askOtherLimits: PARTYS_SIDE,
  startRework: LEADS_SIDE,
  finishRework: LEADS_SIDE,
  verifyRework: PARTYS_SIDE,
  withdrawFitReport: BOTH_SIDES,
  writeClientWords: LEADS_SIDE,
  listConsents: commission('-YNNNYN000'),
  answerConsent: record('-N000Y0000', '-N000Y0000', '-0000000N0', '-N00000000'),

  listHandoffs: ALL_HERE,
  getHandoff: record('-Y0YY00000', '-Y0YY00000'),
  createHandoff: { own: '-YNYNNN000', other: '-YNNYNN000', foreign: THEIRS, missing: '-YNNNNN000' },
  previewHandoffDay: HANDOFF_SIDES,
  offerHandoffDay: HANDOFF_SIDES,
  acceptHandoffDay: HANDOFF_SIDES,
  declineHandoffDay: HANDOFF_SIDES,
  withdrawHandoffDay: HANDOFF_SIDES,
  completeHandoff: record('-Y0NN00000', '-Y0NN00000'),

  listThreads: ALL_HERE,
  openThread: commission('-YNYYYN000'),
  listMessages: BOTH_SIDES,
  postMessage: BOTH_SIDES,
  markThreadRead: BOTH_SIDES,

  listFiles: BOTH_SIDES,
  uploadFile: BOTH_SIDES,
  readFileContent: BOTH_SIDES,
  removeFile: PARTYS_SIDE,

  getStanding: commission('-YNYYYY000'),
  getBench: EVERY_PERSON,
  markBenchSeen: EVERY_PERSON,
  listMoved: ALL_HERE,
};
