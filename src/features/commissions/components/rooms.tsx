import { useSuspenseQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { moveLeg, type LegView, type PartView } from '../../../../shared/contracts/parts-and-legs.ts';
import { mayDo } from '../../../../shared/abilities/ability.ts';
import { standingFor } from '../../../../shared/engines/standing/standing.ts';
import { shortDay } from '../../../../shared/units/calendar-day.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useSight } from '../../../hooks/use-membership.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { keys } from '../../../lib/query-keys.ts';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { handoffQueries } from '../../../lib/queries/handoffs.ts';
import { jointQueries, reportQueries } from '../../../lib/queries/joints.ts';
import { LEG_KIND_WORDS, LEG_STATE_STAMPS, REPORT_STATE_STAMPS } from '../../../lib/words.ts';

/** Parts and who holds each, with what may be done to each by the reader. */
export function WhoHasWhat({ commissionId, actsOf }: { commissionId: string; actsOf?: (part: PartView) => ReactNode }) {
  const { data: parts } = useSuspenseQuery(commissionQueries.parts(commissionId));
  const { nameOf } = usePartyBook(commissionId);
  return (
    <Sheet title="Who has what">
      {parts.length === 0 ? (
        <EmptyState title="No parts yet">
          Hilt, pommel, chassis and blade will be listed with who holds them.
        </EmptyState>
      ) : (
        <dl className="grid grid-cols-[auto_1fr] gap-x-6">
          {parts.map((part) => (
            <div key={part.id} className="contents">
              <dt className="border-b border-hairline py-2">{part.name}</dt>
              <dd className="border-b border-hairline py-2">
                {nameOf(part.holderPartyId)}{' '}
                <span className="text-note text-lead-grey">since {shortDay(part.holderSince)}</span>
              </dd>
              {actsOf && <dd className="col-span-2 border-b border-hairline">{actsOf(part)}</dd>}
            </div>
          ))}
        </dl>
      )}
    </Sheet>
  );
}

/** Starts or finishes one of the reader's own legs as of today. */
export function LegActs({ commissionId, leg, today }: { commissionId: string; leg: LegView; today: string }) {
  const { ability } = useSight(commissionId);
  const move = useAct(moveLeg, {
    said: 'The leg is updated.',
    stale: () => [keys.legs.list(commissionId), keys.standing.detail(commissionId), keys.bench()],
  });
  if (!mayDo(ability, 'move', 'Leg', { commissionId, partyId: leg.partyId })) return null;
  const next = leg.state === 'planned' ? 'under-way' : leg.state === 'under-way' ? 'finished' : null;
  if (!next) return null;
  const run = (early: boolean): void =>
    move.run({
      params: { commissionId, legId: leg.id },
      body: { revision: leg.revision, state: next, onDay: today, early },
    });
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap gap-2">
        <Button
          variant="outline"
          busy={move.pending}
          disabled={leg.held !== null && next === 'finished'}
          onClick={() => run(false)}
        >
          {next === 'under-way' ? 'Start today' : 'Finished today'}
        </Button>
        {move.problem?.code === 'not-in-this-state' && next === 'under-way' && (
          <Button variant="quiet" onClick={() => run(true)}>
            Start early all the same
          </Button>
        )}
      </div>
      <ProblemNotice problem={move.problem} />
    </div>
  );
}

/** Legs of the reader's own shop. */
export function OwnLegs({ commissionId, today }: { commissionId: string; today: string }) {
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { mine } = useSight(commissionId);
  const own = legs.filter((leg) => mine.has(leg.partyId) && leg.state !== 'dropped');
  if (own.length === 0) return null;
  return (
    <Sheet title="Your legs">
      <ul>
        {own.map((leg) => (
          <li key={leg.id} className="grid gap-2 border-b border-hairline py-3 last:border-b-0">
            <p className="flex flex-wrap items-center gap-2">
              <span className="font-semibold">{leg.title}</span>
              <span className="text-note text-lead-grey">{LEG_KIND_WORDS[leg.kind]}</span>
              <Stamp tone={LEG_STATE_STAMPS[leg.state].tone}>{LEG_STATE_STAMPS[leg.state].words}</Stamp>
              {leg.held && <Stamp tone="oxide">Held since {shortDay(leg.held.sinceDay)}</Stamp>}
            </p>
            {leg.privateNote && <p className="text-note text-lead-grey">Own note: {leg.privateNote}</p>}
            <LegActs commissionId={commissionId} leg={leg} today={today} />
          </li>
        ))}
      </ul>
    </Sheet>
  );
}

/** Joints the reader answers for, and the reports on them. */
export function JointsAndReports({ commissionId }: { commissionId: string }) {
  const { data: joints } = useSuspenseQuery(jointQueries.list(commissionId));
  const { data: reports } = useSuspenseQuery(reportQueries.list(commissionId));
  const { nameOf } = usePartyBook(commissionId);
  return (
    <Sheet title="Joints">
      {joints.length === 0 ? (
        <EmptyState title="No joints yet">
          Where two parts meet, and who answers for each side, will stand here.
        </EmptyState>
      ) : (
        <ul>
          {joints.map((joint) => {
            const open = reports.find((report) => report.id === joint.openReportId);
            return (
              <li key={joint.id} className="border-b border-hairline py-3 last:border-b-0">
                <p className="flex flex-wrap items-center gap-2">
                  <Link
                    className="font-semibold underline decoration-hairline underline-offset-4"
                    to={`/commissions/${commissionId}/joints/${joint.id}`}
                  >
                    {joint.name}
                  </Link>
                  {joint.holeClass && joint.shaftClass && (
                    <span className="figures text-note">
                      {joint.holeClass}/{joint.shaftClass}
                    </span>
                  )}
                  {joint.handFit && <span className="text-note text-lead-grey">{joint.handFit}</span>}
                </p>
                <p className="text-note text-lead-grey">
                  {nameOf(joint.holePartyId)} and {nameOf(joint.shaftPartyId)}
                </p>
                {open && (
                  <p className="flex flex-wrap items-center gap-2 pt-1">
                    <Link className="underline" to={`/commissions/${commissionId}/reports/${open.id}`}>
                      {open.title}
                    </Link>
                    <Stamp tone={REPORT_STATE_STAMPS[open.state].tone}>{REPORT_STATE_STAMPS[open.state].words}</Stamp>
                  </p>
                )}
              </li>
            );
          })}
        </ul>
      )}
    </Sheet>
  );
}

/** Handoffs that are not done, the reader's own first. */
export function OpenHandoffs({ commissionId }: { commissionId: string }) {
  const { data: handoffs } = useSuspenseQuery(handoffQueries.list(commissionId));
  const { data: standing } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const { nameOf } = usePartyBook(commissionId);
  const partName = new Map(standing.facts.parts.map((part) => [part.id, part.name]));
  const open = handoffs.filter((handoff) => !handoff.doneOn);
  return (
    <Sheet title="Handoffs to come">
      {open.length === 0 ? (
        <EmptyState title="None planned">Parts that change hands will be listed with their days.</EmptyState>
      ) : (
        <ul>
          {open.map((handoff) => {
            const offered = handoff.offers?.find((offer) => offer.state === 'standing');
            return (
              <li key={handoff.id} className="border-b border-hairline py-3 last:border-b-0">
                <Link
                  className="underline decoration-hairline underline-offset-4"
                  to={`/commissions/${commissionId}/handoffs/${handoff.id}`}
                >
                  {handoff.partIds
                    .map((id) => partName.get(id))
                    .filter(Boolean)
                    .join(', ')}
                  : {nameOf(handoff.fromPartyId)} to {nameOf(handoff.toPartyId)}
                </Link>
                <p className="text-note text-lead-grey">
                  {handoff.agreedOn ? `agreed ${shortDay(handoff.agreedOn)}` : 'no day agreed'}
                  {offered && `; ${nameOf(offered.byPartyId)} offers ${shortDay(offered.onDay)}`}
                </p>
              </li>
            );
          })}
        </ul>
      )}
    </Sheet>
  );
}

/** What the client is told just now, so that everyone says the same. */
export function ToldToClient({ commissionId }: { commissionId: string }) {
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const standing = standingFor(data.facts, data.todayIso);
  const lines = [
    ...standing.waitsOnYou.map((wait) => `Waits on the client: ${wait.words}`),
    ...standing.waitsOnOthers.map((words) => `Waits on ${words}`),
    ...standing.now.map((now) => now.words),
    ...(standing.nextAgreedDate ? [`Next agreed day: ${standing.nextAgreedDate.words}`] : []),
  ];
  return (
    <Sheet title="What the client sees" note="The headline above, and this">
      {lines.length === 0 ? (
        <p className="text-lead-grey">Nothing beyond the headline.</p>
      ) : (
        <ul className="grid gap-1">
          {lines.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      )}
    </Sheet>
  );
}
