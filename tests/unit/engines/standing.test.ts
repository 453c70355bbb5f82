import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clientFactsFrom } from '../../../shared/engines/standing/client-facts-from.ts';
import type { CommissionFacts } from '../../../shared/engines/standing/commission-facts.ts';
import { standingFor } from '../../../shared/engines/standing/standing.ts';
import { facts, leg, report, TODAY } from './commission-facts-builders.ts';

const headline = (changes: Partial<CommissionFacts>): string =>
  standingFor(clientFactsFrom(facts(changes)), TODAY).headline;

describe('the headline', () => {
  it.each<[string, Partial<CommissionFacts>, string]>([
    ['work going on', {}, 'Being wired at Tinder Lane Electrics. Expected 13–20 April, 3 days later than last told.'],
    [
      'held, and nothing will show',
      { reports: [report()] },
      'Held at Tinder Lane Electrics since Monday for a small correction: the end cap was too tight. Nothing will show. Expected 13–20 April, 3 days later than last told.',
    ],
    [
      'held before the lead released words',
      { reports: [report({ clientWords: '' }, null)], told: null },
      'Held at Tinder Lane Electrics since Monday for a small correction: a part does not yet go together as agreed. Expected 13–20 April.',
    ],
    [
      'waiting for consent',
      {
        reports: [report({ state: 'agreed' }, { shows: true, consent: 'asked', consentAskedOn: '2026-03-10' })],
        told: null,
        expected: null,
      },
      'Waiting on Orla Penhallow: your consent to a correction that will show. Held at Tinder Lane Electrics since Monday for a small correction: the end cap was too tight. It will show, and waits for your consent.',
    ],
    [
      'a report that does not block',
      { reports: [report({ blocking: false })], told: null, expected: null },
      'Being wired at Tinder Lane Electrics.',
    ],
    [
      'a closed report',
      { reports: [report({ state: 'closed' })], told: null, expected: null },
      'Being wired at Tinder Lane Electrics.',
    ],
    [
      'parallel work',
      { legs: [leg(), leg({ id: 'leg-2', partyId: 'turner', kind: 'blade' })], told: null, expected: null },
      'Being wired at Tinder Lane Electrics and having its blade made at Aldgrove Turning.',
    ],
    [
      'between benches',
      { legs: [leg({ state: 'planned', startedOn: null, likelyStartOn: '2026-03-12' })], told: null, expected: null },
      'Between benches. Next: wiring at Tinder Lane Electrics, planned for Thursday 12 March (in 2 days).',
    ],
    ['no plan yet', { legs: [], told: null, expected: null }, 'The brief is being settled; no work is planned yet.'],
    ['delivered', { deliveredOn: '2026-03-09' }, 'Delivered on Monday 9 March.'],
  ])('%s', (_case, changes, words) => expect(headline(changes)).toBe(words));
});

it('what was said of a rework that failed is not said of the next one', () => {
  const reopened = report({ state: 'raised' }, { shows: false, consent: null });
  expect(headline({ reports: [reopened], told: null, expected: null })).toBe(
    'Held at Tinder Lane Electrics since Monday for a small correction: the end cap was too tight.',
  );
});

it('says where each part is, what is agreed next, and who is waited for', () => {
  const standing = standingFor(
    clientFactsFrom(
      facts({
        reports: [report()],
        handoffs: [
          {
            id: 'h',
            fromPartyId: 'turner',
            toPartyId: 'wirer',
            partIds: ['hilt'],
            agreedOn: '2026-03-12',
            doneOn: null,
            standingOffer: null,
          },
        ],
      }),
    ),
    TODAY,
  );
  expect(standing.whereEachPartIs).toEqual([
    { partId: 'hilt', words: 'Hilt: with Tinder Lane Electrics since Sat 7 Mar' },
  ]);
  expect(standing.nextAgreedDate?.words).toBe(
    'Hilt from Aldgrove Turning to Tinder Lane Electrics on Thursday 12 March (in 2 days)',
  );
  expect(standing.waitsOnOthers).toEqual(['Tinder Lane Electrics, for a correction']);
  expect(standing.timeline.map((step) => step.state)).toEqual(['held', 'next']);
});

/** Any commission: parties, legs and reports in every state that hang together. */
const someDay = fc.integer({ min: 1, max: 28 }).map((day) => `2026-03-${String(day).padStart(2, '0')}`);
const someParty = fc.constantFrom('turner', 'wirer', 'client');
const someNote = fc.record({
  id: fc.constant('note-1'),
  agreed: fc.boolean(),
  method: fc.string(),
  removeOnDiameterUm: fc.nat(500),
  risk: fc.string(),
  shows: fc.boolean(),
  costMinor: fc.nat(9999),
  costBorneByPartyId: fc.option(someParty),
  consent: fc.constantFrom('asked', 'given', 'refused', null),
  consentAskedOn: fc.option(someDay),
});
const someFacts: fc.Arbitrary<CommissionFacts> = fc.record({
  title: fc.string(),
  code: fc.constant('7Q4M K2X9'),
  brief: fc.string(),
  budgetMinor: fc.option(fc.nat()),
  deliveredOn: fc.option(someDay),
  told: fc.constant(null),
  expected: fc.constant({ fromDay: '2026-04-13', toDay: '2026-04-20' }),
  parties: fc.constant(facts().parties),
  parts: fc.constant(facts().parts),
  legs: fc.uniqueArray(
    fc.record({
      id: fc.constantFrom('leg-1', 'leg-2', 'leg-3'),
      partyId: someParty,
      partId: fc.constant('hilt'),
      kind: fc.constantFrom('machining', 'finishing', 'wiring', 'bench-test'),
      title: fc.string(),
      state: fc.constantFrom('planned', 'under-way', 'finished', 'dropped'),
      plannedStartOn: fc.option(someDay),
      startedOn: fc.option(someDay),
      finishedOn: fc.option(someDay),
      likelyStartOn: fc.option(someDay),
      likelyFinishOn: fc.option(someDay),
      hopefulDays: fc.nat(9),
      likelyDays: fc.nat(9),
      badDays: fc.nat(9),
      privateNote: fc.string(),
    }),
    { selector: (one) => one.id },
  ),
  reports: fc.uniqueArray(
    fc.record({
      id: fc.constantFrom('report-1', 'report-2'),
      title: fc.string(),
      plainWords: fc.string(),
      state: fc.constantFrom('raised', 'answered', 'agreed', 'being-reworked', 'to-be-verified', 'closed', 'withdrawn'),
      blocking: fc.boolean(),
      heldLegId: fc.constantFrom('leg-1', 'leg-2', null),
      raisedOn: someDay,
      raisedByPartyId: someParty,
      answerPartyId: someParty,
      clientWords: fc.string(),
      note: fc.option(someNote),
    }),
    { selector: (one) => one.id },
  ),
  handoffs: fc.uniqueArray(
    fc.record({
      id: fc.constantFrom('h-1', 'h-2'),
      fromPartyId: fc.constantFrom('turner', 'wirer'),
      toPartyId: fc.constantFrom('turner', 'wirer'),
      partIds: fc.constant(['hilt']),
      agreedOn: fc.option(someDay),
      doneOn: fc.option(someDay),
      standingOffer: fc.option(
        fc.record({
          byPartyId: fc.constantFrom('turner', 'wirer'),
          onDay: someDay,
          words: fc.string(),
          offeredOn: someDay,
        }),
      ),
    }),
    { selector: (one) => one.id },
  ),
  threads: fc.array(fc.record({ audience: fc.string(), lastMessage: fc.string() })),
});

/** Every fact that a client may not see, changed to something else. */
const changeSecrets = (all: CommissionFacts, word: string, figure: number): CommissionFacts => ({
  ...all,
  brief: all.brief + word,
  budgetMinor: figure,
  threads: [...all.threads, { audience: 'makers', lastMessage: word }],
  legs: all.legs.map((one) => ({
    ...one,
    privateNote: word,
    hopefulDays: figure,
    likelyDays: figure,
    badDays: figure,
  })),
  reports: all.reports.map((one) => ({
    ...one,
    title: word,
    plainWords: word,
    note: one.note && {
      ...one.note,
      method: word,
      removeOnDiameterUm: figure,
      risk: word,
      costMinor: figure,
      costBorneByPartyId: null,
      // Whether a rework that nobody has agreed to would show is the makers' own talk.
      shows: one.note.agreed ? one.note.shows : !one.note.shows,
    },
  })),
  // An offer between two shops is theirs until both agree.
  handoffs: all.handoffs.map((one) => ({
    ...one,
    standingOffer: { byPartyId: 'turner', onDay: '2026-05-05', words: word, offeredOn: '2026-03-01' },
  })),
});

const toldTo = (all: CommissionFacts): string =>
  JSON.stringify([clientFactsFrom(all), standingFor(clientFactsFrom(all), TODAY)]);

it('for any commission, changing what clients may not see changes no byte of what the client gets', () => {
  fc.assert(
    fc.property(someFacts, fc.string({ minLength: 1 }), fc.nat(500), (all, word, figure) => {
      expect(toldTo(changeSecrets(all, word, figure))).toBe(toldTo(all));
    }),
    { numRuns: 500 },
  );
});

it('the order in which facts come changes nothing', () => {
  fc.assert(
    fc.property(someFacts, (all) => {
      const turned = {
        ...all,
        legs: [...all.legs].reverse(),
        reports: [...all.reports].reverse(),
        handoffs: [...all.handoffs].reverse(),
        parties: [...all.parties].reverse(),
        parts: [...all.parts].reverse(),
      };
      expect(toldTo(turned)).toBe(toldTo(all));
    }),
  );
});

it('what a client may see does change the answer, so that the two tests above can fail', () => {
  expect(toldTo(facts({ reports: [report()] }))).not.toBe(
    toldTo(facts({ reports: [report({ clientWords: 'Other words' })] })),
  );
});
