import { useEffect, useRef, useState } from 'react';
import type { ThreadPresence } from '../../../shared/realtime/events.ts';
import { onConnected, onPresence, tell } from '../../lib/socket.ts';

const TYPING_PAUSE_MS = 3000;

/** Who is in the thread with the reader, and who is typing. */
export function usePresence(commissionId: string, threadId: string, ownAccountId: string) {
  const [seen, setSeen] = useState<{ threadId: string; people: ThreadPresence['people'] }>({ threadId, people: [] });
  const typing = useRef<ReturnType<typeof setTimeout> | undefined>(undefined);

  useEffect(() => {
    const enter = (): void => void tell('thread.enter', { commissionId, threadId });
    const stopPresence = onPresence((presence) => {
      if (presence.threadId === threadId) setSeen(presence);
    });
    const stopConnections = onConnected(enter);
    enter();
    return () => {
      clearTimeout(typing.current);
      typing.current = undefined;
      stopPresence();
      stopConnections();
      void tell('thread.leave', { threadId });
    };
  }, [commissionId, threadId]);

  const stopTyping = (): void => {
    clearTimeout(typing.current);
    if (typing.current !== undefined) void tell('thread.typing', { threadId, typing: false });
    typing.current = undefined;
  };
  /** Called at each key; the first says "typing", a pause says it is over. */
  const typed = (): void => {
    if (typing.current === undefined) void tell('thread.typing', { threadId, typing: true });
    clearTimeout(typing.current);
    typing.current = setTimeout(stopTyping, TYPING_PAUSE_MS);
  };
  const people = seen.threadId === threadId ? seen.people.filter((person) => person.accountId !== ownAccountId) : [];
  return { here: people, typed, stopTyping };
}
