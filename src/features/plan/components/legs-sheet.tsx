import { useSuspenseQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { LegView } from '../../../../shared/contracts/parts-and-legs.ts';
import { shortDay } from '../../../../shared/units/calendar-day.ts';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Fold } from '../../../components/ui/fold.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { useSight } from '../../../hooks/use-membership.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { LEG_KIND_WORDS, LEG_STATE_STAMPS } from '../../../lib/words.ts';
import type { PlanChoices } from './choices.tsx';
import { EditLeg } from './leg-form.tsx';

const daysOf = (leg: LegView): string =>
  leg.finishedOn
    ? `done ${shortDay(leg.finishedOn)}`
    : leg.startedOn
      ? `since ${shortDay(leg.startedOn)}`
      : leg.plannedStartOn
        ? `not before ${shortDay(leg.plannedStartOn)}`
        : 'no day yet';

/** Legs in their order, what each waits for, and the acts open to the reader. */
export function LegsSheet({ choices, actsOf }: { choices: PlanChoices; actsOf: (leg: LegView) => ReactNode }) {
  const { commissionId } = choices;
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { mine, roles } = useSight(commissionId);
  const { nameOf } = usePartyBook(commissionId);
  const titles = new Map(legs.map((leg) => [leg.id, leg.title]));
  return (
    <Sheet title="Legs">
      {legs.length === 0 && (
        <EmptyState title="No legs yet">
          Machining, finishing, chassis, wiring, blade, test: each shop's portion of the work, and what it waits for.
        </EmptyState>
      )}
      <ol>
        {legs.map((leg) => (
          <li key={leg.id} className="grid gap-2 border-b border-hairline py-4 last:border-b-0">
            <p className="flex flex-wrap items-center gap-2">
              <span className="font-semibold">{leg.title}</span>
              <Stamp tone={LEG_STATE_STAMPS[leg.state].tone}>{LEG_STATE_STAMPS[leg.state].words}</Stamp>
              {leg.held && (
                <Stamp tone="oxide">
                  {leg.held.title ? `Held: ${leg.held.title}` : `Held since ${shortDay(leg.held.sinceDay)}`}
                </Stamp>
              )}
            </p>
            <p className="text-note text-lead-grey">
              {nameOf(leg.partyId)}, {LEG_KIND_WORDS[leg.kind].toLowerCase()}, {daysOf(leg)}
              {leg.likelyDays !== undefined && (
                <span className="figures">
                  {' '}
                  · {leg.hopefulDays} / {leg.likelyDays} / {leg.badDays} days
                </span>
              )}
              {leg.afterLegIds.length > 0 && ` · waits for ${leg.afterLegIds.map((id) => titles.get(id)).join(', ')}`}
            </p>
            {actsOf(leg)}
            {(mine.has(leg.partyId) || roles.has('lead')) && leg.state !== 'finished' && leg.state !== 'dropped' && (
              <Fold summary={roles.has('lead') ? 'Change this leg' : 'Change the estimates or the own note'}>
                <EditLeg
                  key={leg.id}
                  choices={choices}
                  leg={leg}
                  isLead={roles.has('lead')}
                  isOwn={mine.has(leg.partyId)}
                />
              </Fold>
            )}
          </li>
        ))}
      </ol>
    </Sheet>
  );
}
