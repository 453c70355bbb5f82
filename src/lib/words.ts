import type {
  CommissionState,
  JointKind,
  LegKind,
  LegState,
  PartKind,
  PartyRole,
  ReportState,
  ShopRole,
} from '../../shared/contracts/vocabulary.ts';
import type { Tone } from '../components/ui/tone.ts';

/** How the closed word lists read on the page. */
export const ROLE_WORDS: Readonly<Record<PartyRole, string>> = {
  lead: 'Lead',
  maker: 'Maker',
  finisher: 'Finisher',
  installer: 'Installer',
  client: 'Client',
  guest: 'Guest',
};

export const SHOP_ROLE_WORDS: Readonly<Record<ShopRole, string>> = {
  owner: 'Owner',
  hand: 'Hand',
  bookkeeper: 'Bookkeeper',
};

export const COMMISSION_STATE_WORDS: Readonly<Record<CommissionState, string>> = {
  'in-brief': 'In brief',
  'at-work': 'At work',
  delivered: 'Delivered',
  ended: 'Ended',
};

export const LEG_KIND_WORDS: Readonly<Record<LegKind, string>> = {
  machining: 'Machining',
  finishing: 'Finishing',
  chassis: 'Chassis',
  wiring: 'Wiring',
  blade: 'Blade',
  'bench-test': 'Bench test',
  other: 'Other work',
};

export const LEG_STATE_STAMPS: Readonly<Record<LegState, { words: string; tone: Tone }>> = {
  planned: { words: 'Planned', tone: 'neutral' },
  'under-way': { words: 'Under way', tone: 'brass' },
  finished: { words: 'Finished', tone: 'verdigris' },
  dropped: { words: 'Dropped', tone: 'neutral' },
};

export const PART_KIND_WORDS: Readonly<Record<PartKind, string>> = {
  hilt: 'Hilt',
  pommel: 'Pommel',
  emitter: 'Emitter',
  chassis: 'Chassis',
  blade: 'Blade',
  switch: 'Switch',
  grip: 'Grip',
  other: 'Other part',
};

export const JOINT_KIND_WORDS: Readonly<Record<JointKind, string>> = {
  'spigot-in-bore': 'Spigot in bore',
  'chassis-in-cavity': 'Chassis in cavity',
  'blade-in-holder': 'Blade in holder',
  'plunger-in-hole': 'Plunger in its hole',
  'screw-in-thread': 'Screw in its thread',
  other: 'Other joint',
};

/** What each side of a joint is called at the bench. */
export const SIDE_WORDS: Readonly<Record<JointKind, { hole: string; shaft: string }>> = {
  'spigot-in-bore': { hole: 'bore', shaft: 'spigot' },
  'chassis-in-cavity': { hole: 'cavity', shaft: 'chassis' },
  'blade-in-holder': { hole: 'holder', shaft: 'blade' },
  'plunger-in-hole': { hole: 'hole', shaft: 'plunger' },
  'screw-in-thread': { hole: 'thread', shaft: 'screw' },
  other: { hole: 'outer part', shaft: 'inner part' },
};

export const REPORT_STATE_STAMPS: Readonly<Record<ReportState, { words: string; tone: Tone }>> = {
  raised: { words: 'Waits for an answer', tone: 'oxide' },
  answered: { words: 'Answered', tone: 'brass' },
  agreed: { words: 'Rework agreed', tone: 'brass' },
  'being-reworked': { words: 'Being reworked', tone: 'gun-blue' },
  'to-be-verified': { words: 'To be verified', tone: 'gun-blue' },
  closed: { words: 'Closed', tone: 'verdigris' },
  withdrawn: { words: 'Withdrawn', tone: 'neutral' },
};
