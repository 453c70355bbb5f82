import { useSuspenseQuery } from '@tanstack/react-query';
import type { ThreadView } from '../../../../shared/contracts/threads.ts';
import { mayDo } from '../../../../shared/abilities/ability.ts';
import { Button } from '../../../components/ui/button.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Notice } from '../../../components/ui/notice.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Skeleton } from '../../../components/ui/skeleton.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { useSight } from '../../../hooks/use-membership.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { meQuery } from '../../../lib/queries/me.ts';
import { audienceWords, readersOf } from '../audience-words.ts';
import { usePresence } from '../use-presence.ts';
import { useReadUpTo } from '../use-read-up-to.ts';
import { useThreadMessages } from '../use-thread-messages.ts';
import { Composer } from './composer.tsx';
import { MessageRow } from './message-row.tsx';

/** A conversation, live: its audience always in sight, who is here, and the messages in their one order. */
export function ThreadSheet({
  commissionId,
  thread,
  headingLevel = 2,
}: {
  commissionId: string;
  thread: ThreadView;
  headingLevel?: 2 | 3;
}) {
  const { data: me } = useSuspenseQuery(meQuery());
  const { ability } = useSight(commissionId);
  const { parties, nameOf } = usePartyBook(commissionId);
  const { messages, lastSequence, pending, failed, again, look, hasOlder, loadingOlder, showOlder } = useThreadMessages(
    commissionId,
    thread.id,
  );
  const { here, typed, stopTyping } = usePresence(commissionId, thread.id, me.id);
  const end = useReadUpTo({
    commissionId,
    threadId: thread.id,
    readSequence: thread.readSequence,
    lastSequence,
  });
  const audience = audienceWords(thread, parties);
  const facts = { commissionId, audience: thread.audience, partyIds: thread.partyIds };
  const typing = here.filter((person) => person.typing).map((person) => person.displayName);

  return (
    <Sheet
      title={thread.title}
      headingLevel={headingLevel}
      stamp={<Stamp tone={thread.audience === 'everyone' ? 'gun-blue' : 'verdigris'}>{audience}</Stamp>}
    >
      {failed && (
        <Notice
          kind="alert"
          tone="oxide"
          title="The messages could not be read"
          actions={
            <Button variant="outline" onClick={again}>
              Try again
            </Button>
          }
        >
          What you write is kept.
        </Notice>
      )}
      {pending && !failed && <Skeleton label="Reading the messages" lines={3} />}
      {hasOlder && (
        <Button variant="quiet" busy={loadingOlder} onClick={showOlder}>
          Show earlier messages
        </Button>
      )}
      {!pending && !failed && messages.length === 0 && (
        <EmptyState title="Nothing written yet">Read by: {audience}.</EmptyState>
      )}
      <div role="log" aria-label={`Messages in ${thread.title}`} data-testid={`thread-${thread.audience}`}>
        <ol>
          {messages.map((message) => (
            <MessageRow
              key={message.id}
              message={message}
              commissionId={commissionId}
              partyName={nameOf(message.authorPartyId)}
              namesYou={message.mentionedAccountIds.includes(me.id)}
            />
          ))}
        </ol>
      </div>
      <div ref={end} />
      <p className="min-h-6 py-1 text-note text-lead-grey" aria-live="polite">
        {typing.length > 0
          ? `${typing.join(', ')} ${typing.length === 1 ? 'is' : 'are'} writing`
          : here.length > 0
            ? `Here now: ${here.map((person) => person.displayName).join(', ')}`
            : ''}
      </p>
      {mayDo(ability, 'post', 'Thread', facts) && (
        <Composer
          commissionId={commissionId}
          threadId={thread.id}
          audience={audience}
          readers={readersOf(thread, parties)}
          onTyped={typed}
          onSent={() => {
            stopTyping();
            look();
          }}
        />
      )}
    </Sheet>
  );
}
