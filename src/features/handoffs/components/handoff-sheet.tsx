import { useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import * as contracts from '../../../../shared/contracts/handoffs.ts';
import type { HandoffView } from '../../../../shared/contracts/handoffs.ts';
import { mayDo } from '../../../../shared/abilities/ability.ts';
import { shortDay, weekdayDayMonth } from '../../../../shared/units/calendar-day.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { RelativeDay } from '../../../components/ui/relative-day.tsx';
import { Fold } from '../../../components/ui/fold.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { useSight } from '../../../hooks/use-membership.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { keys } from '../../../lib/query-keys.ts';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { handoffQueries } from '../../../lib/queries/handoffs.ts';
import { shortInstant } from '../../../lib/today.ts';
import { DropHandoff } from './drop-handoff.tsx';

interface HandoffProps {
  commissionId: string;
  handoff: HandoffView;
  today: string;
}

const standingOf = (handoff: HandoffView) => handoff.offers?.find((offer) => offer.state === 'standing') ?? null;

/** What a day does to the client's date, said before anyone agrees to it. */
function DayEffect({ commissionId, handoffId, onDay }: { commissionId: string; handoffId: string; onDay: string }) {
  const { data } = useQuery({
    ...handoffQueries.effect(commissionId, handoffId, onDay),
    enabled: /^\d{4}-\d{2}-\d{2}$/.test(onDay),
  });
  return (
    <p className="min-h-6 text-note text-lead-grey" aria-live="polite">
      {data?.words ?? ''}
    </p>
  );
}

/** Offers a day, or counters the one that stands. What is typed is kept until it is offered. */
function OfferDay({ commissionId, handoff, today, countering }: HandoffProps & { countering: boolean }) {
  const [onDay, setOnDay, forgetDay] = useDraft(`handoff-day-${handoff.id}`, '');
  const [words, setWords, forgetWords] = useDraft(`handoff-words-${handoff.id}`, '');
  const offer = useAct(contracts.offerHandoffDay, {
    said: 'The day is offered.',
    stale: () => [keys.handoffs.lists(commissionId), keys.handoffs.detail(commissionId, handoff.id), keys.bench()],
    onDone: () => {
      forgetDay();
      forgetWords();
    },
  });
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        offer.run({
          params: { commissionId, handoffId: handoff.id },
          body: { revision: handoff.revision, onDay, words },
        });
      }}
    >
      <Field label={countering ? 'Another day' : 'Day'}>
        <DateInput value={onDay} min={today} required onChange={(event) => setOnDay(event.target.value)} />
      </Field>
      <Field label="A word with it" optional>
        <TextInput value={words} onChange={(event) => setWords(event.target.value)} />
      </Field>
      <DayEffect commissionId={commissionId} handoffId={handoff.id} onDay={onDay} />
      <div>
        <Button type="submit" variant={countering ? 'outline' : 'primary'} busy={offer.pending}>
          {countering ? 'Offer this day instead' : 'Offer this day'}
        </Button>
      </div>
      <ProblemNotice problem={offer.problem} />
    </form>
  );
}

function AnswerOffer({ commissionId, handoff, today }: HandoffProps) {
  const [declining, setDeclining] = useState(false);
  const [reason, setReason, forgetReason] = useDraft(`handoff-reason-${handoff.id}`, '');
  const stale = () => [
    keys.handoffs.lists(commissionId),
    keys.handoffs.detail(commissionId, handoff.id),
    keys.standing.detail(commissionId),
    keys.bench(),
  ];
  const accept = useAct(contracts.acceptHandoffDay, { said: 'The day is agreed.', stale });
  const decline = useAct(contracts.declineHandoffDay, {
    said: 'The day is declined.',
    stale,
    onDone: () => {
      forgetReason();
      setDeclining(false);
    },
  });
  const standing = standingOf(handoff);
  if (!standing) return null;
  const params = { commissionId, handoffId: handoff.id, offerId: standing.id };
  return (
    <div className="grid gap-4">
      <DayEffect commissionId={commissionId} handoffId={handoff.id} onDay={standing.onDay} />
      <div className="flex flex-wrap gap-2">
        <Button busy={accept.pending} onClick={() => accept.run({ params, body: { revision: handoff.revision } })}>
          Accept {shortDay(standing.onDay)}
        </Button>
        <Button variant="quiet" onClick={() => setDeclining(!declining)} aria-expanded={declining}>
          Decline with a reason
        </Button>
      </div>
      <ProblemNotice problem={accept.problem ?? decline.problem} />
      {declining && (
        <form
          className="grid gap-3"
          onSubmit={(event) => {
            event.preventDefault();
            decline.run({ params, body: { revision: handoff.revision, reason } });
          }}
        >
          <Field label="Why this day does not work" required>
            <TextInput value={reason} required onChange={(event) => setReason(event.target.value)} />
          </Field>
          <div>
            <Button type="submit" variant="outline" busy={decline.pending}>
              Decline {shortDay(standing.onDay)}
            </Button>
          </div>
        </form>
      )}
      <Fold strong summary="Offer another day">
        <OfferDay commissionId={commissionId} handoff={handoff} today={today} countering />
      </Fold>
    </div>
  );
}

function OwnOffer({ commissionId, handoff, today }: HandoffProps) {
  const withdraw = useAct(contracts.withdrawHandoffDay, {
    said: 'The offer is taken back.',
    stale: () => [keys.handoffs.lists(commissionId), keys.handoffs.detail(commissionId, handoff.id), keys.bench()],
  });
  const standing = standingOf(handoff);
  if (!standing) return null;
  return (
    <div className="grid gap-3">
      <p className="text-note text-lead-grey">The other side answers your offer.</p>
      <div>
        <Button
          variant="quiet"
          busy={withdraw.pending}
          onClick={() =>
            withdraw.run({
              params: { commissionId, handoffId: handoff.id, offerId: standing.id },
              body: { revision: handoff.revision },
            })
          }
        >
          Take the offer back
        </Button>
      </div>
      <ProblemNotice problem={withdraw.problem} />
      <Fold strong summary="Offer another day instead">
        <OfferDay commissionId={commissionId} handoff={handoff} today={today} countering={false} />
      </Fold>
    </div>
  );
}

function Receive({ commissionId, handoff, today }: HandoffProps) {
  const [onDay, setOnDay] = useState(today);
  const receive = useAct(contracts.completeHandoff, {
    said: 'The parts are received.',
    stale: () => [keys.commission(commissionId), keys.bench()],
  });
  return (
    <form
      className="grid gap-3 border-t border-hairline pt-4"
      onSubmit={(event) => {
        event.preventDefault();
        receive.run({
          params: { commissionId, handoffId: handoff.id },
          body: { revision: handoff.revision, onDay, words: '' },
        });
      }}
    >
      <Field label="Arrived on">
        <DateInput value={onDay} max={today} required onChange={(event) => setOnDay(event.target.value)} />
      </Field>
      <div>
        <Button type="submit" variant="outline" busy={receive.pending}>
          The parts are here
        </Button>
      </div>
      <ProblemNotice problem={receive.problem} />
    </form>
  );
}

/** One handoff: what each side offers, live, and the acts that are open to this reader. */
export function HandoffSheet({
  commissionId,
  handoffId,
  today,
}: {
  commissionId: string;
  handoffId: string;
  today: string;
}) {
  const { data: handoff } = useSuspenseQuery(handoffQueries.detail(commissionId, handoffId));
  const { data: standingData } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const { ability, mine } = useSight(commissionId);
  const { nameOf } = usePartyBook(commissionId);
  const partNames = standingData.facts.parts
    .filter((part) => handoff.partIds.includes(part.id))
    .map((part) => part.name);
  const facts = { commissionId, fromPartyId: handoff.fromPartyId, toPartyId: handoff.toPartyId };
  const mayOffer = mayDo(ability, 'offer', 'Handoff', facts) && !handoff.doneOn;
  const standing = standingOf(handoff);
  const ownOffer =
    standing !== null &&
    mine.has(standing.byPartyId) &&
    !(mine.has(handoff.fromPartyId) && mine.has(handoff.toPartyId));
  const shared = { commissionId, handoff, today };
  return (
    <Sheet
      title={`Handoff: ${partNames.join(', ')} to ${nameOf(handoff.toPartyId)}`}
      stamp={
        handoff.doneOn ? (
          <Stamp tone="verdigris">Handed over {shortDay(handoff.doneOn)}</Stamp>
        ) : handoff.agreedOn ? (
          <Stamp tone="verdigris">Agreed {shortDay(handoff.agreedOn)}</Stamp>
        ) : (
          <Stamp tone="brass">No day agreed</Stamp>
        )
      }
    >
      <dl className="grid gap-x-6 border-b border-hairline sm:grid-cols-[auto_1fr]" data-testid="handoff-sides">
        {[handoff.fromPartyId, handoff.toPartyId].map((partyId) => {
          const latest = handoff.offers?.find((offer) => offer.byPartyId === partyId);
          const answered = standing && standing.byPartyId !== partyId;
          return (
            <div key={partyId} className="contents">
              <dt className="pt-2 font-semibold">{nameOf(partyId)}</dt>
              <dd className="pb-2 sm:pt-2">
                {standing?.byPartyId === partyId ? (
                  <>
                    offers <strong>{weekdayDayMonth(standing.onDay)}</strong>
                    {standing.words && <>: “{standing.words}”</>}
                  </>
                ) : answered ? (
                  <span className="text-lead-grey">has not answered</span>
                ) : latest?.state === 'accepted' || handoff.agreedOn ? (
                  <>agreed to {handoff.agreedOn && <RelativeDay day={handoff.agreedOn} today={today} />}</>
                ) : latest?.state === 'declined' ? (
                  <>
                    offered {shortDay(latest.onDay)}, declined: “{latest.reason}”
                  </>
                ) : (
                  <span className="text-lead-grey">has offered no day</span>
                )}
              </dd>
            </div>
          );
        })}
      </dl>
      <p className="py-3 text-note text-lead-grey">
        {handoff.carriage ? `${handoff.carriage}, ` : ''}
        {handoff.transitDays === 1 ? '1 working day' : `${handoff.transitDays} working days`} on the way.
        {handoff.agreedOn && standing && ` ${shortDay(handoff.agreedOn)} stays agreed until the new day is accepted.`}
      </p>
      {mayOffer &&
        (standing ? (
          ownOffer ? (
            <OwnOffer {...shared} />
          ) : (
            <AnswerOffer {...shared} />
          )
        ) : handoff.agreedOn ? (
          <Fold strong summary="Ask to move the agreed day">
            <OfferDay {...shared} countering={false} />
          </Fold>
        ) : (
          <OfferDay {...shared} countering={false} />
        ))}
      {mayDo(ability, 'receive', 'Handoff', facts) && handoff.agreedOn && !handoff.doneOn && <Receive {...shared} />}
      {mayDo(ability, 'drop', 'Handoff', facts) && !handoff.doneOn && (
        <DropHandoff commissionId={commissionId} handoff={handoff} />
      )}
      {handoff.offers && handoff.offers.length > 0 && (
        <Fold summary="All offers so far">
          <ol className="grid gap-1 text-note text-lead-grey">
            {handoff.offers.map((offer) => (
              <li key={offer.id}>
                {nameOf(offer.byPartyId)} ({offer.byName}) offered {shortDay(offer.onDay)}, {shortInstant(offer.at)}:{' '}
                {offer.state}
                {offer.answeredBy && ` by ${offer.answeredBy}`}
                {offer.reason && `, “${offer.reason}”`}
              </li>
            ))}
          </ol>
        </Fold>
      )}
    </Sheet>
  );
}
