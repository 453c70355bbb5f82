import { describe, expect, it } from 'vitest';
import { checkLegMove } from '../../../shared/engines/legs/leg-states.ts';
import { checkOfferAct, type HandoffFacts } from '../../../shared/engines/handoffs/offer-rules.ts';
import {
  isOpenReport,
  nextReportState,
  openReportActs,
  REPORT_STEPS,
  type ReportAct,
  type ReportState,
} from '../../../shared/engines/reports/report-states.ts';

/** What each act makes of each state; a state that is not listed refuses it. */
const TABLE: Record<ReportAct, Partial<Record<ReportState, ReportState>>> = {
  answer: { raised: 'answered', answered: 'answered' },
  agree: { answered: 'agreed' },
  'ask-other-limits': { answered: 'raised', agreed: 'raised' },
  'start-rework': { agreed: 'being-reworked' },
  'finish-rework': { 'being-reworked': 'to-be-verified' },
  'verify-pass': { 'to-be-verified': 'closed' },
  'verify-fail': { 'to-be-verified': 'raised' },
  withdraw: {
    raised: 'withdrawn',
    answered: 'withdrawn',
    agreed: 'withdrawn',
    'being-reworked': 'withdrawn',
    'to-be-verified': 'withdrawn',
  },
};
const STATES: ReportState[] = [
  'raised',
  'answered',
  'agreed',
  'being-reworked',
  'to-be-verified',
  'closed',
  'withdrawn',
];

describe('a fit report', () => {
  it.each(Object.keys(REPORT_STEPS) as ReportAct[])(
    '%s goes from and to the states of the table, and from no other',
    (act) => {
      for (const state of STATES) {
        const answer = nextReportState({ state, shows: false, consent: null }, act);
        expect([state, answer.ok ? answer.state : null]).toEqual([state, TABLE[act][state] ?? null]);
      }
    },
  );

  it.each([
    ['asked', false],
    ['refused', false],
    [null, false],
    ['given', true],
  ] as const)('that shows starts its rework with consent %s: %s', (consent, may) =>
    expect(nextReportState({ state: 'agreed', shows: true, consent }, 'start-rework').ok).toBe(may),
  );

  it.each([
    ['asked', false],
    ['given', false],
    [null, false],
    ['refused', true],
  ] as const)('that shows, is agreed and has consent %s takes another answer: %s', (consent, may) => {
    const report = { state: 'agreed', shows: true, consent } as const;
    expect(nextReportState(report, 'answer').ok).toBe(may);
    expect(openReportActs(report).includes('answer')).toBe(may);
  });

  it('is open until it is closed or taken back', () => {
    expect(STATES.filter(isOpenReport)).toEqual(['raised', 'answered', 'agreed', 'being-reworked', 'to-be-verified']);
  });

  it('can be brought to its end from every open state', () => {
    const reach = (from: ReportState): Set<ReportState> => {
      const reached = new Set<ReportState>([from]);
      for (const state of reached)
        for (const act of openReportActs({ state, shows: false, consent: null })) {
          const answer = nextReportState({ state, shows: false, consent: null }, act);
          if (answer.ok) reached.add(answer.state);
        }
      return reached;
    };
    for (const state of STATES.filter(isOpenReport)) expect(reach(state).has('closed')).toBe(true);
    for (const state of ['closed', 'withdrawn'] as const) expect([...reach(state)]).toEqual([state]);
  });
});

describe('a leg', () => {
  const move = (
    state: 'planned' | 'under-way' | 'finished' | 'dropped',
    to: 'planned' | 'under-way' | 'finished' | 'dropped',
    facts = {},
    early = false,
  ) => checkLegMove({ state, held: false, waitsFor: [], ...facts }, { to, early }).ok;

  it('moves on, back and out as a bench does', () => {
    const open = (['planned', 'under-way', 'finished', 'dropped'] as const).map((from) =>
      (['planned', 'under-way', 'finished', 'dropped'] as const).filter((to) => move(from, to)),
    );
    expect(open).toEqual([['under-way', 'dropped'], ['planned', 'finished', 'dropped'], ['under-way'], ['planned']]);
  });

  it('is not finished while it is held, and not started before what it waits for unless early on purpose', () => {
    expect(move('under-way', 'finished', { held: true })).toBe(false);
    expect(move('planned', 'under-way', { waitsFor: ['Patina'] })).toBe(false);
    expect(move('planned', 'under-way', { waitsFor: ['Patina'] }, true)).toBe(true);
  });
});

describe("a handoff's day", () => {
  const handoff = (changes: Partial<HandoffFacts> = {}): HandoffFacts => ({
    fromPartyId: 'from',
    toPartyId: 'to',
    agreedOn: null,
    doneOn: null,
    standing: { id: 'o', byPartyId: 'from', onDay: '2026-03-12' },
    ...changes,
  });

  it('is answered by the other side and never by the one that offered it', () => {
    for (const act of ['accept', 'decline'] as const)
      expect([checkOfferAct(handoff(), act, ['to']).ok, checkOfferAct(handoff(), act, ['from']).ok]).toEqual([
        true,
        false,
      ]);
    expect([
      checkOfferAct(handoff(), 'withdraw', ['from']).ok,
      checkOfferAct(handoff(), 'withdraw', ['to']).ok,
    ]).toEqual([true, false]);
  });

  it("is countered by the other side and replaced by one's own", () => {
    expect(checkOfferAct(handoff(), 'offer', ['to'])).toEqual({ ok: true, answers: 'countered' });
    expect(checkOfferAct(handoff(), 'offer', ['from'])).toEqual({ ok: true, answers: 'withdrawn' });
    expect(checkOfferAct(handoff({ standing: null }), 'offer', ['from'])).toEqual({ ok: true, answers: null });
  });

  it('is not agreed twice for the same day, nor after the parts have arrived', () => {
    expect(checkOfferAct(handoff({ standing: null, agreedOn: '2026-03-12' }), 'offer', ['from'], '2026-03-12').ok).toBe(
      false,
    );
    for (const act of ['offer', 'accept', 'decline', 'withdraw'] as const)
      expect(checkOfferAct(handoff({ doneOn: '2026-03-12' }), act, ['to']).ok).toBe(false);
  });
});
