import { Link } from 'react-router-dom';
import { acceptHandoffDay } from '../../../../shared/contracts/handoffs.ts';
import { moveLeg } from '../../../../shared/contracts/parts-and-legs.ts';
import type { BenchItemView } from '../../../../shared/contracts/standing.ts';
import { shortDay } from '../../../../shared/units/calendar-day.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { buttonClass } from '../../../components/ui/button-class.ts';
import { Button } from '../../../components/ui/button.tsx';
import { RelativeDay } from '../../../components/ui/relative-day.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { keys } from '../../../lib/query-keys.ts';

const LEAD_IN: Readonly<Record<BenchItemView['kind'], string>> = {
  'answer-report': '',
  'agree-rework': '',
  'start-rework': '',
  'finish-rework': '',
  'verify-rework': '',
  consent: '',
  'answer-offer': '',
  'offer-day': '',
  'receive-parts': 'Receive ',
  'start-leg': 'Start: ',
  'finish-leg': 'Finish: ',
  'read-mention': '',
};

const ACT_WORDS: Readonly<Record<BenchItemView['kind'], string>> = {
  'answer-report': 'Answer',
  'agree-rework': 'Read the answer',
  'start-rework': 'Open the report',
  'finish-rework': 'Open the report',
  'verify-rework': 'Enter readings',
  consent: 'Look and decide',
  'answer-offer': 'Offer another',
  'offer-day': 'Offer a day',
  'receive-parts': 'Receive',
  'start-leg': 'Open the plan',
  'finish-leg': 'Open the plan',
  'read-mention': 'Read',
};

function addressOf(item: BenchItemView): string {
  const base = `/commissions/${item.commissionId}`;
  switch (item.kind) {
    case 'consent':
      return base;
    case 'answer-offer':
    case 'offer-day':
    case 'receive-parts':
      return `${base}/handoffs/${item.refId}`;
    case 'start-leg':
    case 'finish-leg':
      return `${base}/plan`;
    case 'read-mention':
      return `${base}/threads/${item.refId}`;
    default:
      return `${base}/reports/${item.refId}`;
  }
}

/** Accepts the offered day in place. */
function AcceptDay({ item }: { item: BenchItemView }) {
  const accept = useAct(acceptHandoffDay, {
    said: 'The day is agreed.',
    stale: () => [keys.bench(), keys.commission(item.commissionId)],
  });
  if (!item.offerId || item.refRevision === null || !item.day) return null;
  const { offerId, refRevision: revision, day } = item;
  return (
    <>
      <Button
        busy={accept.pending}
        onClick={() =>
          accept.run({
            params: { commissionId: item.commissionId, handoffId: item.refId, offerId },
            body: { revision },
          })
        }
      >
        Accept {shortDay(day)}
      </Button>
      <ProblemNotice problem={accept.problem} />
    </>
  );
}

/** Starts or finishes a leg in place, as of today. */
function MoveLeg({ item, today }: { item: BenchItemView; today: string }) {
  const move = useAct(moveLeg, {
    said: 'The leg is updated.',
    stale: () => [keys.bench(), keys.commission(item.commissionId)],
  });
  if (item.refRevision === null) return null;
  const state = item.kind === 'start-leg' ? 'under-way' : 'finished';
  const revision = item.refRevision;
  return (
    <>
      <Button
        variant="outline"
        busy={move.pending}
        onClick={() =>
          move.run({
            params: { commissionId: item.commissionId, legId: item.refId },
            body: { revision, state, onDay: today },
          })
        }
      >
        {state === 'under-way' ? 'Start today' : 'Finished today'}
      </Button>
      <ProblemNotice problem={move.problem} />
    </>
  );
}

/** One row of the bench: the piece, the act and its day, with the act in place where one press does it. */
export function BenchRow({ item, today, mine }: { item: BenchItemView; today: string; mine: boolean }) {
  return (
    <li className="grid gap-2 border-b border-hairline py-4 last:border-b-0 sm:grid-cols-[1fr_auto] sm:items-center">
      <div>
        <p className="stamped text-stamp text-lead-grey">
          {item.commissionTitle} · <span className="figures">{item.commissionCode}</span>
        </p>
        <p>
          {LEAD_IN[item.kind]}
          {item.words}
        </p>
        <p className="flex flex-wrap items-center gap-2 text-note text-lead-grey">
          {!mine && item.whoName && <span>{item.whoName}</span>}
          {item.day && <RelativeDay day={item.day} today={today} form="short" />}
          {item.holdsUp > 0 && (
            <Stamp tone="oxide">{item.holdsUp === 1 ? 'Holds up one leg' : `Holds up ${item.holdsUp} legs`}</Stamp>
          )}
        </p>
      </div>
      <div className="flex flex-wrap gap-2">
        {mine && item.kind === 'answer-offer' && <AcceptDay item={item} />}
        {mine && (item.kind === 'start-leg' || item.kind === 'finish-leg') && <MoveLeg item={item} today={today} />}
        <Link to={addressOf(item)} className={buttonClass('outline')}>
          {mine ? ACT_WORDS[item.kind] : 'Open'}
        </Link>
      </div>
    </li>
  );
}
