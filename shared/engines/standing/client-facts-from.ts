import { isOpenReport } from '../reports/report-states.ts';
import type { ClientFacts, ClientLeg } from './client-facts.ts';
import type { CommissionFacts } from './commission-facts.ts';

/** What the client reads of a hold whose words the lead has not released. */
export const DEFAULT_HOLD_WORDS = 'A part does not yet go together as agreed';

const by =
  <T>(key: (item: T) => string) =>
  (one: T, other: T): number =>
    key(one) < key(other) ? -1 : key(one) > key(other) ? 1 : 0;

type Report = CommissionFacts['reports'][number];

/** The oldest open blocking report of a leg, in the words released for the client. */
function holdOf(reports: readonly Report[], legId: string): ClientLeg['held'] {
  const [first] = reports
    .filter((report) => report.blocking && report.heldLegId === legId && isOpenReport(report.state))
    .sort(by((report) => report.raisedOn + report.id));
  if (!first) return null;
  // A report that is open anew after a failed verification has no agreed rework any more; the old one says nothing of the next.
  const note = first.note?.agreed && first.state !== 'raised' ? first.note : null;
  return {
    sinceDay: first.raisedOn,
    clientWords: first.clientWords || DEFAULT_HOLD_WORDS,
    consentAsked: note?.consent === 'asked',
    willShow: note ? note.shows : null,
  };
}

/**
 * Takes from all that is known what a client may know. Everything else (makers' words, prices, private notes, estimates,
 * offers between shops, threads) ends here: a test changes each of them and finds the client's answer the same to the
 * byte.
 */
export function clientFactsFrom(all: CommissionFacts): ClientFacts {
  const party = new Map(all.parties.map((one) => [one.id, one]));
  const nameOf = (id: string): string => party.get(id)?.name ?? '';
  const isClient = (id: string): boolean => party.get(id)?.isClient ?? false;
  const clients = all.parties.filter((one) => one.isClient).sort(by((one) => one.id));
  const openReports = all.reports
    .filter((report) => isOpenReport(report.state))
    .sort(by((report) => report.raisedOn + report.id));

  const consents = openReports.flatMap((report) =>
    report.note?.consent === 'asked'
      ? [
          {
            kind: 'consent' as const,
            refId: report.note.id,
            words: 'Your consent to a correction that will show',
            sinceDay: report.note.consentAskedOn ?? report.raisedOn,
          },
        ]
      : [],
  );
  const days = all.handoffs.flatMap((handoff) => {
    const offer = handoff.standingOffer;
    const touchesClient = isClient(handoff.fromPartyId) || isClient(handoff.toPartyId);
    return offer && touchesClient && !handoff.doneOn && !isClient(offer.byPartyId)
      ? [
          {
            kind: 'handoff-day' as const,
            refId: handoff.id,
            words: `${nameOf(offer.byPartyId)} offers a day to hand over to you`,
            sinceDay: offer.offeredOn,
          },
        ]
      : [];
  });

  return {
    pieceTitle: all.title,
    code: all.code,
    clientName: clients[0]?.name ?? null,
    parts: [...all.parts].sort(by((part) => String(part.position).padStart(6, '0') + part.id)).map((part) => ({
      id: part.id,
      name: part.name,
      holderName: nameOf(part.holderPartyId),
      sinceDay: part.holderSince,
    })),
    legs: all.legs
      .filter((leg) => leg.state !== 'dropped')
      .sort(by((leg) => (leg.startedOn ?? leg.likelyStartOn ?? leg.plannedStartOn ?? '9999') + leg.id))
      .map((leg) => ({
        id: leg.id,
        kind: leg.kind,
        title: leg.title,
        shopName: nameOf(leg.partyId),
        shopCraft: party.get(leg.partyId)?.craft ?? '',
        partId: leg.partId,
        state: leg.state,
        startedOn: leg.startedOn,
        finishedOn: leg.finishedOn,
        plannedStartOn: leg.startedOn ?? leg.likelyStartOn ?? leg.plannedStartOn,
        plannedFinishOn: leg.finishedOn ?? leg.likelyFinishOn,
        held: leg.state === 'finished' ? null : holdOf(all.reports, leg.id),
      })),
    handoffs: [...all.handoffs].sort(by((handoff) => handoff.id)).map((handoff) => ({
      id: handoff.id,
      partIds: [...handoff.partIds].sort(),
      fromName: nameOf(handoff.fromPartyId),
      toName: nameOf(handoff.toPartyId),
      agreedOn: handoff.agreedOn,
      doneOn: handoff.doneOn,
    })),
    waitingOnClient: [...consents, ...days].sort(by((wait) => wait.sinceDay + wait.refId)),
    waitingOnOthers: othersIn(openReports, nameOf),
    expected: all.expected && {
      ...all.expected,
      previousFromDay: all.told?.fromDay ?? null,
      previousToDay: all.told?.toDay ?? null,
    },
    deliveredOn: all.deliveredOn,
  };
}

/** Who the work waits on, once per shop, in words that give nothing of the report away. */
function othersIn(openReports: readonly Report[], nameOf: (id: string) => string): ClientFacts['waitingOnOthers'] {
  const waits = openReports
    .filter((report) => report.blocking && report.note?.consent !== 'asked')
    .map((report) =>
      report.state === 'answered' || report.state === 'to-be-verified' ? report.raisedByPartyId : report.answerPartyId,
    );
  return [...new Set(waits)]
    .sort(by((id) => nameOf(id) + id))
    .map((id) => ({ who: nameOf(id), forWhat: 'a correction' }));
}
