import type { CommissionFacts } from '../../../shared/engines/standing/commission-facts.ts';

/** Builders of the facts of one invented commission; `changes` replace what a test is about. */
export const TODAY = '2026-03-10';

type Leg = CommissionFacts['legs'][number];
type Report = CommissionFacts['reports'][number];

export const leg = (changes: Partial<Leg> = {}): Leg => ({
  id: 'leg-1',
  partyId: 'wirer',
  partId: 'hilt',
  kind: 'wiring',
  title: 'Wire and fit',
  state: 'under-way',
  plannedStartOn: null,
  startedOn: '2026-03-02',
  finishedOn: null,
  likelyStartOn: '2026-03-02',
  likelyFinishOn: '2026-03-20',
  hopefulDays: 3,
  likelyDays: 5,
  badDays: 8,
  privateNote: 'spare in the drawer',
  ...changes,
});

export const report = (
  changes: Partial<Report> = {},
  note: Partial<NonNullable<Report['note']>> | null = {},
): Report => ({
  id: 'report-1',
  title: 'Pommel will not draw',
  plainWords: 'moves 2 mm',
  state: 'answered',
  blocking: true,
  heldLegId: 'leg-1',
  raisedOn: '2026-03-09',
  raisedByPartyId: 'wirer',
  answerPartyId: 'turner',
  clientWords: 'The end cap was too tight',
  note: note && {
    id: 'note-1',
    agreed: true,
    method: 'turn it',
    removeOnDiameterUm: 118,
    risk: 'thin wall',
    shows: false,
    costMinor: 4500,
    costBorneByPartyId: 'turner',
    consent: null,
    consentAskedOn: null,
    ...note,
  },
  ...changes,
});

export const facts = (changes: Partial<CommissionFacts> = {}): CommissionFacts => ({
  title: 'The Salt Lantern',
  code: '7Q4M K2X9',
  brief: 'brass',
  budgetMinor: 100,
  deliveredOn: null,
  told: { fromDay: '2026-04-10', toDay: '2026-04-17' },
  expected: { fromDay: '2026-04-13', toDay: '2026-04-20' },
  parties: [
    { id: 'turner', name: 'Aldgrove Turning', craft: 'Hilts', isClient: false },
    { id: 'wirer', name: 'Tinder Lane Electrics', craft: 'Wiring', isClient: false },
    { id: 'client', name: 'Orla Penhallow', craft: '', isClient: true },
  ],
  parts: [{ id: 'hilt', name: 'Hilt', position: 0, holderPartyId: 'wirer', holderSince: '2026-03-07' }],
  legs: [leg()],
  reports: [],
  handoffs: [],
  threads: [],
  ...changes,
});
