import { useSuspenseQuery } from '@tanstack/react-query';
import type { ThreadSubject } from '../../shared/contracts/vocabulary.ts';
import { Fold } from '../components/ui/fold.tsx';
import { Sheet } from '../components/ui/sheet.tsx';
import { OpenThread } from '../features/threads/components/open-thread.tsx';
import { ThreadSheet } from '../features/threads/components/thread-sheet.tsx';
import { useSight } from '../hooks/use-membership.ts';
import { threadQueries } from '../lib/queries/threads.ts';

export interface SubjectThreadsProps {
  commissionId: string;
  subject: ThreadSubject;
  subjectId: string;
  title: string;
  /** The two sides, named in a new thread at first. */
  partyIds: readonly string[];
}

/** Threads about one thing, on its own page, and the way to open another. */
export function SubjectThreads({ commissionId, subject, subjectId, title, partyIds }: SubjectThreadsProps) {
  const { data: threads } = useSuspenseQuery(threadQueries.list(commissionId));
  const { mine } = useSight(commissionId);
  const here = threads.filter((thread) => thread.subject === subject && thread.subjectId === subjectId);
  const opener = (
    <OpenThread
      commissionId={commissionId}
      subject={subject}
      subjectId={subjectId}
      suggestedTitle={title}
      suggestedPartyIds={partyIds.filter((id) => !mine.has(id))}
    />
  );
  return (
    <>
      {here.map((thread) => (
        <ThreadSheet key={thread.id} commissionId={commissionId} thread={thread} />
      ))}
      {here.length === 0 ? (
        <Sheet title="Talk about this">{opener}</Sheet>
      ) : (
        <Fold summary="Open another thread about this">
          <Sheet title="Another thread">{opener}</Sheet>
        </Fold>
      )}
    </>
  );
}
