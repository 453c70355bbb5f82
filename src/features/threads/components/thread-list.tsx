import { useSuspenseQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { ThreadSubject } from '../../../../shared/contracts/vocabulary.ts';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { threadQueries } from '../../../lib/queries/threads.ts';
import { shortInstant } from '../../../lib/today.ts';
import { audienceWords } from '../audience-words.ts';

const SUBJECT_WORDS: Readonly<Record<ThreadSubject, string>> = {
  commission: 'the whole piece',
  leg: 'a leg',
  joint: 'a joint',
  report: 'a fit report',
  handoff: 'a handoff',
};

/** Threads the reader may read, the unread ones marked. */
export function ThreadList({ commissionId }: { commissionId: string }) {
  const { data: threads } = useSuspenseQuery(threadQueries.list(commissionId));
  const { parties } = usePartyBook(commissionId);
  if (threads.length === 0)
    return <EmptyState title="No threads yet">Conversations about this piece will be listed here.</EmptyState>;
  return (
    <ul>
      {threads.map((thread) => {
        const unread = thread.lastSequence - thread.readSequence;
        return (
          <li key={thread.id} className="border-b border-hairline py-3 last:border-b-0">
            <Link
              to={`/commissions/${commissionId}/threads/${thread.id}`}
              className={`underline decoration-hairline underline-offset-4 ${unread > 0 ? 'font-semibold' : ''}`}
            >
              {thread.title}
            </Link>
            <p className="flex flex-wrap items-center gap-2 text-note text-lead-grey">
              <span>about {SUBJECT_WORDS[thread.subject]}</span>
              <span>· {audienceWords(thread, parties)}</span>
              {thread.lastMessageAt && <span>· {shortInstant(thread.lastMessageAt)}</span>}
              {unread > 0 && <Stamp tone="brass">{unread} unread</Stamp>}
              {thread.unreadMentions > 0 && <Stamp tone="oxide">You are named</Stamp>}
            </p>
          </li>
        );
      })}
    </ul>
  );
}
