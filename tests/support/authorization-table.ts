/**
 * What each route answers to each role, written from the product's roles and not from the code. One letter a role, in the
 * order of `ROLES`: anonymous; owner, hand and bookkeeper of the lead's shop; owner and hand of the maker's shop; finisher;
 * client; guest (standing and pictures); removed party; guest whose time is over; outsider (lead of the other commission);
 * steward.
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

const NOBODY = '-000000000000';
/** For the lead of the other commission alone. */
const THEIRS = '-0000000000Y0';

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

const EVERY_PERSON = same('-YYYYYYYYYYYY');
const ANYONE = same('YYYYYYYYYYYYY');
/** Refused as wrong credentials, whoever asks. */
const WRONG = same('-------------');

const ALL_HERE = commission('-YYYYYYYY0000');
const LEAD_ACT = commission('-YYNNNNNN0000');
/** A shop is its people's: the maker's for `own`, the finisher's for `other`. */
const SHOPS_OWN = record('-000YY0000000', '-00000Y000000', NOBODY);
/** Only owners change it; its hand sees it. */
const SHOP_OWNERS = record('-000YN0000000', '-00000Y000000', NOBODY);
/** The lead, and the party itself. */
const BOTH_SIDES = record('-YY0YY0000000', '-YY000Y000000');
/** The lead acts on it, the party only sees it. */
const LEADS_SIDE = record('-YY0NN0000000', '-YY000N000000');
/** The party acts on it, the lead only sees it. */
const PARTYS_SIDE = record('-NN0YY0000000', '-NN000Y000000', '-0000000000N0');
/** A handoff's two sides; other shops see its plan. */
const HANDOFF_SIDES = record('-YY0YYN000000', '-YY0NNY000000');

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

  listShops: same('-NNNNNNNNNNNY'),
  createShop: same('-NNNNNNNNNNNY'),
  getShop: SHOPS_OWN,
  updateShop: SHOP_OWNERS,
  listShopMembers: SHOPS_OWN,
  inviteShopMember: SHOP_OWNERS,
  withdrawShopInvitation: SHOP_OWNERS,
  changeShopMember: SHOP_OWNERS,
  removeShopMember: SHOP_OWNERS,

  listCommissions: EVERY_PERSON,
  createCommission: commission('-YYNNNNNNNNNN', '-NNNNNNNNNNYN'),
  getCommission: ALL_HERE,
  updateCommission: LEAD_ACT,
  listParties: commission('-YYYYYYYN0000'),
  inviteParty: LEAD_ACT,
  withdrawInvitation: record('-YYNNNNNN0000', '-YYNNNNNN0000', THEIRS, '-00NNNNNN0000'),
  removeParty: record('-YYNNNNNN0000', '-YYNNNNNN0000', THEIRS, '-00NNNNNN0000'),

  listParts: commission('-YYNYYYYN0000'),
  createPart: LEAD_ACT,
  updatePart: record('-YY0NNNN00000', '-YY0NNNN00000'),
  listLegs: ALL_HERE,
  createLeg: LEAD_ACT,
  updateLeg: record('-YYNYYN000000', '-YYNNNY000000'),
  moveLeg: record('-NNNYYN000000', '-NNNNNY000000', '-0000000000N0'),

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
  listConsents: commission('-YYNNNNYN0000'),
  answerConsent: record('-NN0000Y00000', '-NN0000Y00000', '-0000000000N0', '-NN0000000000'),

  listHandoffs: ALL_HERE,
  getHandoff: record('-YY0YYY000000', '-YY0YYY000000'),
  createHandoff: { own: '-YYNYYNNN0000', other: '-YYNNNYNN0000', foreign: THEIRS, missing: '-YYNNNNNN0000' },
  previewHandoffDay: HANDOFF_SIDES,
  offerHandoffDay: HANDOFF_SIDES,
  acceptHandoffDay: HANDOFF_SIDES,
  declineHandoffDay: HANDOFF_SIDES,
  withdrawHandoffDay: HANDOFF_SIDES,
  dropHandoff: record('-YY0NNN000000', '-YY0NNN000000'),
  completeHandoff: record('-YY0NNN000000', '-YY0NNN000000'),

  listThreads: ALL_HERE,
  openThread: commission('-YYNYYYYN0000'),
  listMessages: BOTH_SIDES,
  postMessage: BOTH_SIDES,
  markThreadRead: BOTH_SIDES,

  listFiles: BOTH_SIDES,
  uploadFile: BOTH_SIDES,
  readFileContent: BOTH_SIDES,
  // Whoever sent it may take it back: here the owner of each shop.
  removeFile: record('-NN0YN0000000', '-NN000Y000000', '-0000000000N0'),

  getStanding: ALL_HERE,
  getBench: EVERY_PERSON,
  markBenchSeen: EVERY_PERSON,
  listMoved: ALL_HERE,
};
