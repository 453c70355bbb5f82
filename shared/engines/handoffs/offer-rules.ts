export interface StandingOffer {
  id: string;
  byPartyId: string;
  onDay: string;
}

export interface HandoffFacts {
  fromPartyId: string;
  toPartyId: string;
  agreedOn: string | null;
  doneOn: string | null;
  standing: StandingOffer | null;
}

export type OfferAct = 'offer' | 'accept' | 'decline' | 'withdraw';

export type OfferAnswer =
  /** For `offer`: whether it counters the other side's standing offer or replaces one's own. */
  { ok: true; answers: 'countered' | 'withdrawn' | null } | { ok: false; words: string };

/**
 * Whether a side may do an act now. A side never answers its own offer; a new offer beside an agreed day leaves that day
 * in force until the other side accepts; a handoff that is done has no date to agree.
 */
export function checkOfferAct(
  handoff: HandoffFacts,
  act: OfferAct,
  byPartyIds: readonly string[],
  onDay?: string,
): OfferAnswer {
  const { standing } = handoff;
  if (handoff.doneOn) return { ok: false, words: 'This handoff is done; its day cannot be changed any more.' };
  const own = standing !== null && byPartyIds.includes(standing.byPartyId);
  if (act === 'offer') {
    if (onDay !== undefined && onDay === handoff.agreedOn && !standing)
      return { ok: false, words: 'This is the day you have agreed already.' };
    if (!standing) return { ok: true, answers: null };
    return { ok: true, answers: own ? 'withdrawn' : 'countered' };
  }
  if (!standing) return { ok: false, words: 'That offer does not stand any more. Look at what stands now.' };
  const bothSides = byPartyIds.includes(handoff.fromPartyId) && byPartyIds.includes(handoff.toPartyId);
  if (act === 'withdraw')
    return own
      ? { ok: true, answers: null }
      : { ok: false, words: 'Only the side that offered a day can take it back.' };
  if (own && !bothSides) return { ok: false, words: 'The other side answers your offer.' };
  return { ok: true, answers: null };
}
