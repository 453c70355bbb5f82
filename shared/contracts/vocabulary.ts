/** The closed word lists of the trade as this product uses them; the glossary explains each. */
export const PARTY_ROLES = ['lead', 'maker', 'finisher', 'installer', 'client', 'guest'] as const;
export type PartyRole = (typeof PARTY_ROLES)[number];
export const SHOP_PARTY_ROLES = ['lead', 'maker', 'finisher', 'installer'] as const;

export const SHOP_ROLES = ['owner', 'hand', 'bookkeeper'] as const;
export type ShopRole = (typeof SHOP_ROLES)[number];

/** What the lead can tick for a guest. */
export const GUEST_SIGHTS = ['standing', 'pictures', 'threads', 'parts'] as const;
export type GuestSight = (typeof GUEST_SIGHTS)[number];

export const COMMISSION_STATES = ['in-brief', 'at-work', 'delivered', 'ended'] as const;
export type CommissionState = (typeof COMMISSION_STATES)[number];

export const PART_KINDS = ['hilt', 'pommel', 'emitter', 'chassis', 'blade', 'switch', 'grip', 'other'] as const;
export type PartKind = (typeof PART_KINDS)[number];

export const LEG_KINDS = ['machining', 'finishing', 'chassis', 'wiring', 'blade', 'bench-test', 'other'] as const;
export type LegKind = (typeof LEG_KINDS)[number];

export const LEG_STATES = ['planned', 'under-way', 'finished', 'dropped'] as const;
export type LegState = (typeof LEG_STATES)[number];

export const JOINT_KINDS = [
  'spigot-in-bore',
  'chassis-in-cavity',
  'blade-in-holder',
  'plunger-in-hole',
  'screw-in-thread',
  'other',
] as const;
export type JointKind = (typeof JOINT_KINDS)[number];

/** ISO 286-1 calls the outer part the hole and the inner part the shaft, whatever they look like. */
export const JOINT_SIDES = ['hole', 'shaft'] as const;
export type JointSide = (typeof JOINT_SIDES)[number];

export const REPORT_STATES = [
  'raised',
  'answered',
  'agreed',
  'being-reworked',
  'to-be-verified',
  'closed',
  'withdrawn',
] as const;
export type ReportState = (typeof REPORT_STATES)[number];
export const OPEN_REPORT_STATES = ['raised', 'answered', 'agreed', 'being-reworked', 'to-be-verified'] as const;

export const NOTE_STATES = ['offered', 'agreed', 'other-limits-asked', 'done'] as const;
export type NoteState = (typeof NOTE_STATES)[number];

export const CONSENT_STATES = ['asked', 'given', 'refused'] as const;
export type ConsentState = (typeof CONSENT_STATES)[number];

export const OFFER_STATES = ['standing', 'accepted', 'countered', 'declined', 'withdrawn'] as const;
export type OfferState = (typeof OFFER_STATES)[number];

/** Who reads a thread. It is fixed when the thread is opened and never widens. */
export const AUDIENCES = ['own-shop', 'named', 'makers', 'everyone'] as const;
export type Audience = (typeof AUDIENCES)[number];

export const THREAD_SUBJECTS = ['commission', 'leg', 'joint', 'report', 'handoff'] as const;
export type ThreadSubject = (typeof THREAD_SUBJECTS)[number];

export const FILE_PLACES = ['thread', 'report', 'commission'] as const;
export type FilePlace = (typeof FILE_PLACES)[number];

export const FILE_PURPOSES = ['message', 'before', 'after', 'cover', 'brief', 'condition'] as const;
export type FilePurpose = (typeof FILE_PURPOSES)[number];

export const LENGTH_UNITS = ['mm', 'inch', 'inch-fraction'] as const;
export type LengthUnit = (typeof LENGTH_UNITS)[number];

/** ISO 4217 codes the product offers. */
export const CURRENCIES = ['EUR', 'USD', 'GBP', 'JPY', 'KWD'] as const;
export type Currency = (typeof CURRENCIES)[number];

/** Names of the tints a shop is drawn in; the colours behind them live in the theme. */
export const SHOP_TINTS = ['verdigris', 'brass', 'gun-blue', 'oxide', 'plum', 'moss'] as const;
export type ShopTint = (typeof SHOP_TINTS)[number];
