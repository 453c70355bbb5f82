import { useSuspenseQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { standingFor } from '../../../../shared/engines/standing/standing.ts';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { reportQueries } from '../../../lib/queries/joints.ts';
import { shortInstant } from '../../../lib/today.ts';
import { ConsentCard } from './consent-card.tsx';

export interface ClientWindowProps {
  commissionId: string;
  /** The band downwards, the thread and the pictures, each from its own feature. */
  band: ReactNode;
  thread: ReactNode;
  pictures: ReactNode;
}

/** The client's page: one column, what waits on them first, and nothing to learn. */
export function ClientWindow({ commissionId, band, thread, pictures }: ClientWindowProps) {
  const { data: commission } = useSuspenseQuery(commissionQueries.detail(commissionId));
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const { data: consents } = useSuspenseQuery(reportQueries.consents(commissionId));
  const standing = standingFor(data.facts, data.todayIso);
  const asked = consents.filter((consent) => consent.state === 'asked');
  const days = standing.waitsOnYou.filter((wait) => wait.kind === 'handoff-day');
  return (
    <div className="mx-auto grid w-full max-w-words gap-5">
      <Sheet title="Waiting on you">
        {asked.length === 0 && days.length === 0 && (
          <p className="text-lead-grey">Nothing. You will hear from us when something does.</p>
        )}
        {asked.map((consent) => (
          <ConsentCard key={consent.noteId} commissionId={commissionId} consent={consent} />
        ))}
        {days.map((wait) => (
          <p key={wait.refId} className="py-3">
            <Link className="underline" to={`/commissions/${commissionId}/handoffs/${wait.refId}`}>
              {wait.words}
            </Link>
          </p>
        ))}
      </Sheet>
      <Sheet title="The way so far">{band}</Sheet>
      <Sheet title="Where it is">
        {standing.whereEachPartIs.length === 0 && <p className="text-lead-grey">There is no part of it yet.</p>}
        <ul className="grid gap-1">
          {standing.whereEachPartIs.map((part) => (
            <li key={part.partId}>{part.words}</li>
          ))}
        </ul>
        {standing.nextAgreedDate && <p className="pt-3">Next agreed day: {standing.nextAgreedDate.words}.</p>}
      </Sheet>
      {pictures}
      {thread}
      <Sheet title="Papers">
        {commission.brief && <p className="max-w-words whitespace-pre-line">{commission.brief}</p>}
        <p className="pt-3 text-note text-lead-grey">The brief. Last changed {shortInstant(commission.updatedAt)}.</p>
        {consents
          .filter((consent) => consent.state !== 'asked')
          .map((consent) => (
            <ConsentCard key={consent.noteId} commissionId={commissionId} consent={consent} />
          ))}
      </Sheet>
    </div>
  );
}
