export type LegState = 'planned' | 'under-way' | 'finished' | 'dropped';

export interface LegMoveFacts {
  state: LegState;
  /** An open blocking report holds the leg. */
  held: boolean;
  /** Titles of the legs it waits for that are neither finished nor dropped. */
  waitsFor: readonly string[];
}

export type MoveAnswer = { ok: true } | { ok: false; words: string };

const NEXT: Readonly<Record<LegState, readonly LegState[]>> = {
  planned: ['under-way', 'dropped'],
  'under-way': ['finished', 'planned', 'dropped'],
  finished: ['under-way'],
  dropped: ['planned'],
};

/**
 * Whether a leg may move to a state. A held leg cannot be finished; one that waits for others starts only when they are
 * finished, or early on purpose.
 */
export function checkLegMove(leg: LegMoveFacts, move: { to: LegState; early: boolean }): MoveAnswer {
  if (!NEXT[leg.state].includes(move.to))
    return {
      ok: false,
      words: `A leg that is ${leg.state.replace('-', ' ')} cannot become ${move.to.replace('-', ' ')}.`,
    };
  if (move.to === 'finished' && leg.held)
    return {
      ok: false,
      words: 'An open report holds this leg. It can be finished when the report is closed or withdrawn.',
    };
  if (move.to === 'under-way' && leg.state === 'planned' && leg.waitsFor.length > 0 && !move.early)
    return {
      ok: false,
      words: `This leg waits for ${leg.waitsFor.join(', ')}. Say that you start early if you mean to.`,
    };
  return { ok: true };
}
