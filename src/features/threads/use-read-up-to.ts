import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, type RefObject } from 'react';
import { markThreadRead } from '../../../shared/contracts/threads.ts';
import { api } from '../../lib/api.ts';
import { keys } from '../../lib/query-keys.ts';

interface ReadUpTo {
  commissionId: string;
  threadId: string;
  /** What the server knows as read. */
  readSequence: number;
  /** Of the newest message that is shown. */
  lastSequence: number;
}

/**
 * Marks a thread as read once its end is before the reader's eyes: in view, in a page that is looked at.
 * @returns for the element after the newest message
 */
export function useReadUpTo({
  commissionId,
  threadId,
  readSequence,
  lastSequence,
}: ReadUpTo): RefObject<HTMLDivElement | null> {
  const queryClient = useQueryClient();
  const end = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (lastSequence <= readSequence || !end.current) return;
    let inView = false;
    let sent = false;
    const mark = (): void => {
      if (sent || !inView || document.visibilityState !== 'visible') return;
      sent = true;
      api(markThreadRead, { params: { commissionId, threadId }, body: { readSequence: lastSequence } }).then(
        () =>
          Promise.all(
            [keys.threads.lists(commissionId), keys.bench()].map((queryKey) =>
              queryClient.invalidateQueries({ queryKey }),
            ),
          ),
        // A mark that is lost is made up by the next one: it only ever moves forward.
        () => (sent = false),
      );
    };
    const watcher = new IntersectionObserver(([entry]) => {
      inView = entry?.isIntersecting ?? false;
      mark();
    });
    watcher.observe(end.current);
    document.addEventListener('visibilitychange', mark);
    return () => {
      watcher.disconnect();
      document.removeEventListener('visibilitychange', mark);
    };
  }, [commissionId, threadId, readSequence, lastSequence, queryClient]);
  return end;
}
