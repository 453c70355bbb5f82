import { useState } from 'react';
import { openThread } from '../../../../shared/contracts/threads.ts';
import type { Audience, ThreadSubject } from '../../../../shared/contracts/vocabulary.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useSight } from '../../../hooks/use-membership.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { keys } from '../../../lib/query-keys.ts';

export interface OpenThreadProps {
  commissionId: string;
  subject: ThreadSubject;
  subjectId: string;
  suggestedTitle: string;
  /** Parties named at first, for a thread between the two sides of something. */
  suggestedPartyIds?: readonly string[];
  onOpened?: (threadId: string) => void;
}

const AUDIENCE_WORDS: Readonly<Record<Audience, string>> = {
  named: 'Only the parties named below, and the lead',
  makers: 'All makers, not the client',
  everyone: 'Everyone, the client too',
  'own-shop': 'My own shop alone',
};

/** Opens a thread. Who reads it is chosen now and never widens. */
export function OpenThread({
  commissionId,
  subject,
  subjectId,
  suggestedTitle,
  suggestedPartyIds = [],
  onOpened,
}: OpenThreadProps) {
  const { isClient, mine } = useSight(commissionId);
  const { parties } = usePartyBook(commissionId);
  const [title, setTitle] = useState(suggestedTitle);
  const [audience, setAudience] = useState<Audience>(isClient ? 'everyone' : 'named');
  const [named, setNamed] = useState<readonly string[]>(suggestedPartyIds);
  const open = useAct(openThread, {
    said: 'The thread is open.',
    stale: () => [keys.threads.lists(commissionId)],
    onDone: (thread) => onOpened?.(thread.id),
  });
  const others = parties.filter((party) => !mine.has(party.id) && !party.roles.includes('guest'));
  const audiences = (Object.keys(AUDIENCE_WORDS) as Audience[]).filter(
    (one) => !isClient || one === 'everyone' || one === 'named',
  );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        open.run({
          params: { commissionId },
          body: { subject, subjectId, title, audience, partyIds: audience === 'named' ? [...named] : [] },
        });
      }}
    >
      <Field label="What it is about">
        <TextInput value={title} required onChange={(event) => setTitle(event.target.value)} />
      </Field>
      <Field label="Who reads it" hint="This cannot be changed later; open another thread for another circle">
        <Select value={audience} onChange={(event) => setAudience(event.target.value as Audience)}>
          {audiences.map((one) => (
            <option key={one} value={one}>
              {AUDIENCE_WORDS[one]}
            </option>
          ))}
        </Select>
      </Field>
      {audience === 'named' && (
        <fieldset className="grid gap-2">
          <legend className="font-semibold">Named parties</legend>
          {others.map((party) => (
            <Checkbox
              key={party.id}
              label={party.displayName}
              checked={named.includes(party.id)}
              onChange={(event) =>
                setNamed(event.target.checked ? [...named, party.id] : named.filter((id) => id !== party.id))
              }
            />
          ))}
        </fieldset>
      )}
      <div>
        <Button
          type="submit"
          variant="outline"
          busy={open.pending}
          disabled={audience === 'named' && named.length === 0}
        >
          Open this thread
        </Button>
      </div>
      <ProblemNotice problem={open.problem} />
    </form>
  );
}
