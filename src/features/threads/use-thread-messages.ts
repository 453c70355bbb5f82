import { useInfiniteQuery, useQueryClient, type InfiniteData } from '@tanstack/react-query';
import { useEffect, useMemo, useRef } from 'react';
import { listMessages, type MessageView } from '../../../shared/contracts/threads.ts';
import type { RouteOutput } from '../../../shared/contracts/route.ts';
import { createThreadFollower } from '../../../shared/realtime/thread-follower.ts';
import { api } from '../../lib/api.ts';
import { keys } from '../../lib/query-keys.ts';
import { onRealtime, onConnected } from '../../lib/socket.ts';

type Page = RouteOutput<typeof listMessages>;
type Pages = InfiniteData<Page, number | null>;

const PAGE = 50;

/**
 * Messages of a thread, oldest first: the newest page, older ones on demand, and new ones as they come. Events only say
 * "look"; what is shown was asked for by sequence, so nothing is lost or doubled over a broken connection.
 */
export function useThreadMessages(commissionId: string, threadId: string) {
  const queryClient = useQueryClient();
  const queryKey = useMemo(() => keys.threads.messages(commissionId, threadId), [commissionId, threadId]);
  const query = useInfiniteQuery({
    queryKey,
    queryFn: ({ signal, pageParam }) =>
      api(
        listMessages,
        { params: { commissionId, threadId }, query: { limit: PAGE, ...(pageParam ? { before: pageParam } : {}) } },
        { signal },
      ),
    initialPageParam: null as number | null,
    // Pages go back in time: the first page holds the newest messages.
    getNextPageParam: (oldest) => {
      const first = oldest.messages[0]?.sequence ?? 1;
      return first > 1 ? first : null;
    },
    // The follower brings what is new; refetching whole pages would move what is under the reader's finger.
    staleTime: Infinity,
  });
  const ready = query.isSuccess;
  const failed = query.isError;
  const { refetch } = query;
  const follow = useRef<() => void>(() => undefined);

  useEffect(() => {
    if (failed) return onConnected(() => void refetch());
  }, [failed, refetch]);

  useEffect(() => {
    if (!ready) return;
    const newest = queryClient.getQueryData<Pages>(queryKey)?.pages[0];
    const follower = createThreadFollower<MessageView>({
      lastSequence: newest?.lastSequence ?? 0,
      fetchAfter: async (after) =>
        (await api(listMessages, { params: { commissionId, threadId }, query: { after, limit: 200 } })).messages,
      onMessages: (messages) =>
        queryClient.setQueryData<Pages>(queryKey, (data) => {
          const [first, ...older] = data?.pages ?? [];
          if (!data || !first) return data;
          const lastSequence = messages.at(-1)?.sequence ?? first.lastSequence;
          return { ...data, pages: [{ messages: [...first.messages, ...messages], lastSequence }, ...older] };
        }),
    });
    const stopEvents = onRealtime('thread.message-added', (event) => {
      if (event.threadId === threadId) follower.poke();
    });
    const stopConnections = onConnected(() => follower.poke());
    follow.current = () => follower.poke();
    follower.poke();
    return () => {
      follow.current = () => undefined;
      stopEvents();
      stopConnections();
      follower.stop();
    };
  }, [ready, queryClient, queryKey, commissionId, threadId]);

  const messages = useMemo(
    () => [...(query.data?.pages ?? [])].reverse().flatMap((page) => page.messages),
    [query.data],
  );
  return {
    messages,
    lastSequence: query.data?.pages[0]?.lastSequence ?? 0,
    pending: query.isPending,
    failed,
    again: () => void refetch(),
    /** Asks for what is new without waiting to be told. */
    look: () => follow.current(),
    hasOlder: query.hasNextPage,
    loadingOlder: query.isFetchingNextPage,
    showOlder: () => void query.fetchNextPage(),
  };
}
