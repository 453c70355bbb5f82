import type { HandoffView } from '../../../shared/contracts/handoffs.ts';
import type { LegView } from '../../../shared/contracts/parts-and-legs.ts';
import type { BandHandoff, BandInput, RingState } from '../../../shared/engines/band/band-types.ts';
import type { ClientFacts } from '../../../shared/engines/standing/client-facts.ts';
import { addDays } from '../../../shared/units/calendar-day.ts';

interface Sources {
  facts: ClientFacts;
  todayIso: string;
  /** Where the reader may see them: what waits for what, and the reports' own titles. */
  legs?: readonly LegView[];
  handoffs?: readonly HandoffView[];
}

function ringOf(
  fact: ClientFacts['handoffs'][number],
  handoff: HandoffView | undefined,
): { state: RingState; day: string | null } {
  if (fact.doneOn) return { state: 'done', day: fact.doneOn };
  const standing = handoff?.offers?.find((offer) => offer.state === 'standing');
  if (standing && !fact.agreedOn)
    return { state: standing.byPartyId === handoff?.fromPartyId ? 'from-agrees' : 'to-agrees', day: standing.onDay };
  return fact.agreedOn ? { state: 'agreed', day: fact.agreedOn } : { state: 'open', day: null };
}

/** What the relay band is drawn from: the client's facts for everyone, sharpened by what this reader may see besides. */
export function bandInputFrom({ facts, todayIso, legs = [], handoffs = [] }: Sources): BandInput {
  const seenLegs = new Map(legs.map((leg) => [leg.id, leg]));
  const seenHandoffs = new Map(handoffs.map((handoff) => [handoff.id, handoff]));
  return {
    todayIso,
    parts: facts.parts,
    legs: facts.legs.flatMap((leg) => {
      if (leg.state === 'dropped') return [];
      const startDay = leg.startedOn ?? leg.plannedStartOn ?? todayIso;
      const seen = seenLegs.get(leg.id);
      return [
        {
          id: leg.id,
          partId: leg.partId,
          shopName: leg.shopName,
          work: leg.title,
          state: leg.state,
          startDay,
          endDay: leg.finishedOn ?? leg.plannedFinishOn ?? addDays(startDay, 1),
          held: leg.held && { sinceDay: leg.held.sinceDay, words: seen?.held?.title ?? leg.held.clientWords },
          afterLegIds: seen?.afterLegIds ?? [],
        },
      ];
    }),
    handoffs: facts.handoffs.map((fact): BandHandoff => {
      const handoff = seenHandoffs.get(fact.id);
      return {
        id: fact.id,
        partIds: fact.partIds,
        fromName: fact.fromName,
        toName: fact.toName,
        fromLegId: handoff?.fromLegId ?? null,
        toLegId: handoff?.toLegId ?? null,
        ...ringOf(fact, handoff),
      };
    }),
    expected: facts.expected,
    deliveredOn: facts.deliveredOn,
  };
}
