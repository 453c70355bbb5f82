import { useEffect, useRef, type KeyboardEvent } from 'react';
import { postMessage } from '../../../../shared/contracts/threads.ts';
import type { PartyView } from '../../../../shared/contracts/commissions.ts';
import { PendingFiles } from '../../../components/pending-files.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { FilePicker } from '../../../components/ui/file-picker.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { useUploads } from '../../../hooks/use-uploads.ts';

export interface ComposerProps {
  commissionId: string;
  threadId: string;
  /** Said all the time while someone writes. */
  audience: string;
  readers: readonly PartyView[];
  onTyped: () => void;
  onSent: () => void;
}

/** One message as it was tried to send. */
interface Attempt {
  id: string;
  text: string;
  fileIds: readonly string[];
}

type Named = PartyView['people'][number];

const mentionedIn = (text: string, people: readonly Named[]): string[] =>
  people.filter((person) => text.includes(`@${person.displayName}`)).map((person) => person.accountId);

/** The word after an @ at the end of the text, while it could still become a name. */
const nameBegun = (text: string): string | null => /(?:^|\s)@([\p{L}' -]{0,30})$/u.exec(text)?.[1] ?? null;

/**
 * Where a message is written. The text is a draft on the device until the server has it; the message keeps its id over
 * every try, so that it is stored once.
 */
export function Composer({ commissionId, threadId, audience, readers, onTyped, onSent }: ComposerProps) {
  const [text, setText, forgetText] = useDraft(`thread-${threadId}`, '');
  const attempt = useRef<Attempt | null>(null);
  const latestText = useRef(text);
  useEffect(() => {
    latestText.current = text;
  });
  const area = useRef<HTMLTextAreaElement>(null);
  const uploads = useUploads({ commissionId, place: 'thread', placeId: threadId, purpose: 'message' });
  const post = useAct(postMessage, {
    said: 'Sent.',
    onDone: () => {
      const sent = attempt.current;
      if (!sent) return;
      // What was written or added while the message was on its way was not in it.
      const rest = latestText.current.startsWith(sent.text)
        ? latestText.current.slice(sent.text.length)
        : latestText.current;
      if (rest.trim() === '') forgetText();
      else setText(rest.trimStart());
      uploads.forget(sent.fileIds);
      attempt.current = null;
      onSent();
    },
  });
  const people = readers.flatMap((party) => party.people);
  const begun = nameBegun(text);
  const offered =
    begun === null
      ? []
      : people.filter((person) => person.displayName.toLowerCase().startsWith(begun.toLowerCase())).slice(0, 5);
  const stored = uploads.files.filter((file) => file.state === 'stored');
  const unsettled = uploads.files.some((file) => file.state !== 'stored');
  const empty = text.trim() === '' && stored.length === 0;
  const send = (): void => {
    if (empty || unsettled || post.pending) return;
    const fileIds = stored.map((file) => file.id);
    // The same words keep their id over every try; other words are another message, or the first would swallow them.
    if (attempt.current?.text !== text || attempt.current.fileIds.join() !== fileIds.join())
      attempt.current = { id: crypto.randomUUID(), text, fileIds };
    post.run({
      params: { commissionId, threadId },
      body: { id: attempt.current.id, body: text, mentionedAccountIds: mentionedIn(text, people), fileIds },
    });
  };
  const choose = (person: Named): void => {
    setText(`${text.replace(/@[\p{L}' -]{0,30}$/u, '')}@${person.displayName} `);
    area.current?.focus();
  };

  return (
    <form
      className="grid gap-3 border-t border-hairline pt-4"
      onSubmit={(event) => {
        event.preventDefault();
        send();
      }}
      onDragOver={(event) => event.preventDefault()}
      onDrop={(event) => {
        event.preventDefault();
        uploads.add([...event.dataTransfer.files]);
      }}
    >
      <Field
        label="Write"
        hint={
          <>
            Read by: <strong>{audience}</strong>
          </>
        }
      >
        <TextArea
          ref={area}
          value={text}
          onChange={(event) => {
            setText(event.target.value);
            onTyped();
          }}
          onPaste={(event) => {
            const files = [...event.clipboardData.files];
            if (files.length === 0) return;
            event.preventDefault();
            uploads.add(files);
          }}
          onKeyDown={(event: KeyboardEvent) => {
            if (event.key !== 'Enter' || !(event.ctrlKey || event.metaKey)) return;
            event.preventDefault();
            send();
          }}
        />
      </Field>
      {offered.length > 0 && (
        <ul className="flex flex-wrap gap-2" aria-label="Name someone">
          {offered.map((person) => (
            <li key={person.accountId}>
              <Button variant="outline" onClick={() => choose(person)}>
                {person.displayName}
              </Button>
            </li>
          ))}
        </ul>
      )}
      <PendingFiles uploads={uploads} />
      <div className="flex flex-wrap items-center gap-2">
        <Button type="submit" busy={post.pending} disabled={empty || unsettled}>
          Send
        </Button>
        <FilePicker
          accept="image/jpeg,image/png,image/webp,image/avif,video/mp4,video/quicktime,application/pdf"
          multiple
          onFiles={uploads.add}
        >
          Add pictures or files
        </FilePicker>
        {text !== '' && <span className="text-note text-lead-grey">draft kept</span>}
      </div>
      <ProblemNotice problem={post.problem} />
    </form>
  );
}
