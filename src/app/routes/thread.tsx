import { useSuspenseQuery } from '@tanstack/react-query';
import { EmptyState } from '../../components/ui/empty-state.tsx';
import { ThreadSheet } from '../../features/threads/components/thread-sheet.tsx';
import { threadQueries } from '../../lib/queries/threads.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const threadId = usePathId('threadId');
  const { data: threads } = useSuspenseQuery(threadQueries.list(commissionId));
  const thread = threads.find((one) => one.id === threadId);
  return thread ? (
    <ThreadSheet key={thread.id} commissionId={commissionId} thread={thread} />
  ) : (
    <EmptyState title="There is no such thread for you">
      It may have another audience, or your part in the commission has ended.
    </EmptyState>
  );
}
