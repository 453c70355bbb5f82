export type ReportState =
  'raised' | 'answered' | 'agreed' | 'being-reworked' | 'to-be-verified' | 'closed' | 'withdrawn';

export type ReportAct =
  | 'answer'
  | 'agree'
  | 'ask-other-limits'
  | 'start-rework'
  | 'finish-rework'
  | 'verify-pass'
  | 'verify-fail'
  | 'withdraw';

/** Who does an act: the side that raised the report, the side that answers for the joint, or either with the lead. */
export type ReportSide = 'raiser' | 'answerer' | 'raiser-or-lead';

interface Step {
  readonly from: readonly ReportState[];
  readonly to: ReportState;
  readonly by: ReportSide;
}

/**
 * A fit report's states. An answer can be given anew until it is agreed, and after the client refused what would show; a
 * verification that fails opens the report again for another answer. `agreed` with a rework that shows waits for the
 * client's consent, which `start-rework` asks for.
 */
export const REPORT_STEPS: Readonly<Record<ReportAct, Step>> = {
  answer: { from: ['raised', 'answered'], to: 'answered', by: 'answerer' },
  agree: { from: ['answered'], to: 'agreed', by: 'raiser' },
  'ask-other-limits': { from: ['answered', 'agreed'], to: 'raised', by: 'raiser' },
  'start-rework': { from: ['agreed'], to: 'being-reworked', by: 'answerer' },
  'finish-rework': { from: ['being-reworked'], to: 'to-be-verified', by: 'answerer' },
  'verify-pass': { from: ['to-be-verified'], to: 'closed', by: 'raiser' },
  'verify-fail': { from: ['to-be-verified'], to: 'raised', by: 'raiser' },
  // Also during the rework: where one side is gone, nobody else could end the report and free its leg.
  withdraw: {
    from: ['raised', 'answered', 'agreed', 'being-reworked', 'to-be-verified'],
    to: 'withdrawn',
    by: 'raiser-or-lead',
  },
};

export const REPORT_STATE_WORDS: Readonly<Record<ReportState, string>> = {
  raised: 'raised, waiting for an answer',
  answered: 'answered, waiting for agreement',
  agreed: 'agreed, rework not begun',
  'being-reworked': 'being reworked',
  'to-be-verified': 'to be verified',
  closed: 'closed',
  withdrawn: 'withdrawn',
};

export interface ReportFacts {
  state: ReportState;
  /** The agreed rework shows when the joint is closed. */
  shows: boolean;
  consent: 'asked' | 'given' | 'refused' | null;
}

export type ReportAnswer = { ok: true; state: ReportState } | { ok: false; words: string };

/** What an act makes of a report, or why it cannot be done as things stand. */
export function nextReportState(report: ReportFacts, act: ReportAct): ReportAnswer {
  const step = REPORT_STEPS[act];
  // What the client refused can only be replaced, and the side that answers need not be asked to.
  if (act === 'answer' && report.state === 'agreed' && report.shows && report.consent === 'refused')
    return { ok: true, state: step.to };
  if (!step.from.includes(report.state))
    return { ok: false, words: `The report is ${REPORT_STATE_WORDS[report.state]}. Nothing was changed.` };
  if (act === 'start-rework' && report.shows && report.consent !== 'given')
    return {
      ok: false,
      words:
        report.consent === 'refused'
          ? 'The client refused this rework, since it shows. Answer with another one.'
          : "This rework shows, so it waits for the client's consent.",
    };
  return { ok: true, state: step.to };
}

/** Acts that are open in a state, consent included; a page offers these to those whose ability allows them. */
export const openReportActs = (report: ReportFacts): ReportAct[] =>
  (Object.keys(REPORT_STEPS) as ReportAct[]).filter((act) => nextReportState(report, act).ok);

export const isOpenReport = (state: ReportState): boolean => state !== 'closed' && state !== 'withdrawn';
