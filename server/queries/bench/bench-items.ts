import type { BenchItemView } from '../../../shared/contracts/standing.ts';
import { showCode } from '../../../shared/engines/codes/crockford.ts';
import type { BenchFacts } from './load-bench.ts';

/** One thing to be done, the party it waits on, and the parties it is no secret to. */
export interface Wait {
  partyId: string;
  concerns: string[];
  item: BenchItemView;
}

type Core = Pick<BenchItemView, 'kind' | 'refId' | 'words'> & Partial<BenchItemView>;

/**
 * Every act that the open commissions wait for, and the party it waits on. The page splits them: mine are what waits on
 * my hands; those of others that concern my parties are what I wait on.
 */
export function waitsOf(facts: BenchFacts, todayIso: string): Wait[] {
  const pieces = new Map(facts.commissions.map((commission) => [commission.id, commission]));
  const names = new Map(facts.parties.map((party) => [party.id, party.name]));
  const legsWaiting = new Map(facts.legs.map((leg) => [leg.id, leg.waiting]));
  const made: Wait[] = [];
  const add = (commissionId: string, partyId: string, concerns: string[], core: Core): void => {
    const piece = pieces.get(commissionId);
    if (!piece) return;
    made.push({
      partyId,
      concerns,
      item: {
        commissionId,
        commissionTitle: piece.title,
        commissionCode: showCode(piece.code),
        coverFileId: piece.coverFileId,
        refRevision: null,
        offerId: null,
        noteId: null,
        day: null,
        holdsUp: 0,
        whoName: names.get(partyId) ?? null,
        ...core,
      },
    });
  };

  for (const report of facts.reports) {
    const both = [report.raisedByPartyId, report.answerPartyId];
    const holdsUp = report.heldLegId ? 1 + (legsWaiting.get(report.heldLegId) ?? 0) : 0;
    const common = {
      refId: report.id,
      refRevision: report.revision,
      noteId: report.noteId,
      day: report.raisedOn,
      holdsUp,
    };
    const step = REPORT_WAIT[report.state];
    if (!step) continue;
    if (report.state === 'agreed' && report.shows && report.consentState === 'asked') {
      const client = facts.parties.find(
        (party) => party.commissionId === report.commissionId && !party.left && party.roles.includes('client'),
      );
      if (client)
        add(report.commissionId, client.id, both, {
          ...common,
          kind: 'consent',
          refId: report.noteId ?? report.id,
          words: 'Your consent to a correction that will show',
        });
      continue;
    }
    if (report.state === 'agreed' && report.consentState === 'refused') {
      add(report.commissionId, report.answerPartyId, both, {
        ...common,
        kind: 'answer-report',
        words: `Answer anew, the client refused: ${report.title}`,
      });
      continue;
    }
    add(report.commissionId, step.side === 'raiser' ? report.raisedByPartyId : report.answerPartyId, both, {
      ...common,
      kind: step.kind,
      words: `${step.words}: ${report.title}`,
    });
  }
  for (const handoff of facts.handoffs) {
    const both = [handoff.fromPartyId, handoff.toPartyId];
    const common = { refId: handoff.id, refRevision: handoff.revision, offerId: handoff.offerId, holdsUp: 0 };
    if (handoff.offerId && handoff.offerByPartyId) {
      const other = handoff.offerByPartyId === handoff.fromPartyId ? handoff.toPartyId : handoff.fromPartyId;
      add(handoff.commissionId, other, both, {
        ...common,
        kind: 'answer-offer',
        day: handoff.offerOn,
        words: `${names.get(handoff.offerByPartyId)} offers a day for ${handoff.partNames}`,
      });
    } else if (!handoff.agreedOn) {
      add(handoff.commissionId, handoff.fromPartyId, both, {
        ...common,
        kind: 'offer-day',
        words: `No day is agreed for ${handoff.partNames} to ${names.get(handoff.toPartyId)}`,
      });
    } else if (handoff.holderReady && handoff.agreedOn <= todayIso) {
      add(handoff.commissionId, handoff.toPartyId, both, {
        ...common,
        kind: 'receive-parts',
        day: handoff.agreedOn,
        words: `${handoff.partNames} from ${names.get(handoff.fromPartyId)}`,
      });
    }
  }
  for (const leg of facts.legs) {
    const common = { refId: leg.id, refRevision: leg.revision, holdsUp: leg.waiting };
    if (leg.state === 'under-way' && !leg.heldSince)
      add(leg.commissionId, leg.partyId, [leg.partyId], { ...common, kind: 'finish-leg', words: leg.title });
    if (leg.state === 'planned' && leg.openBefore === 0)
      add(leg.commissionId, leg.partyId, [leg.partyId], {
        ...common,
        kind: 'start-leg',
        day: leg.plannedStartOn,
        words: leg.title,
      });
  }
  return made;
}

const REPORT_WAIT: Partial<
  Record<string, { side: 'raiser' | 'answerer'; kind: BenchItemView['kind']; words: string }>
> = {
  raised: { side: 'answerer', kind: 'answer-report', words: 'Answer' },
  answered: { side: 'raiser', kind: 'agree-rework', words: 'Agree or ask again' },
  agreed: { side: 'answerer', kind: 'start-rework', words: 'Begin the rework' },
  'being-reworked': { side: 'answerer', kind: 'finish-rework', words: 'Finish the rework' },
  'to-be-verified': { side: 'raiser', kind: 'verify-rework', words: 'Verify by fresh readings' },
};

/** The most held-up work first, then the earliest day, then a fixed order. */
export const byUrgency = (one: BenchItemView, other: BenchItemView): number =>
  other.holdsUp - one.holdsUp ||
  (one.day ?? '9999').localeCompare(other.day ?? '9999') ||
  one.refId.localeCompare(other.refId);
