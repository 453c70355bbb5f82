import { useState } from 'react';
import { raiseFitReport } from '../../../../shared/contracts/fit-reports.ts';
import type { LegView } from '../../../../shared/contracts/parts-and-legs.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { keys } from '../../../lib/query-keys.ts';

export interface RaiseFormProps {
  commissionId: string;
  jointId: string;
  /** Legs that this could hold up: the reader's own first. */
  legs: readonly LegView[];
  onRaised: (reportId: string) => void;
}

/** Says in plain words that a joint does not go together; readings and photographs follow on the report's page. */
export function RaiseForm({ commissionId, jointId, legs, onRaised }: RaiseFormProps) {
  const [title, setTitle, forgetTitle] = useDraft(`raise-title-${jointId}`, '');
  const [words, setWords, forgetWords] = useDraft(`raise-words-${jointId}`, '');
  const [blocking, setBlocking] = useState(true);
  const open = legs.filter((leg) => leg.state === 'under-way' || leg.state === 'planned');
  const [heldLegId, setHeldLegId] = useState(open.find((leg) => leg.state === 'under-way')?.id ?? open[0]?.id ?? '');
  const raise = useAct(raiseFitReport, {
    said: 'The report is raised.',
    stale: () => [
      keys.fitReports.lists(commissionId),
      keys.joints.lists(commissionId),
      keys.joints.detail(commissionId, jointId),
      keys.legs.list(commissionId),
      keys.standing.detail(commissionId),
      keys.bench(),
    ],
    onDone: (detail) => {
      forgetTitle();
      forgetWords();
      onRaised(detail.report.id);
    },
  });
  const holds = blocking && open.length > 0;
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        raise.run({
          params: { commissionId },
          body: { jointId, title, plainWords: words, blocking: holds, heldLegId: holds ? heldLegId : null },
        });
      }}
    >
      <Field label="What is wrong, in a few words" hint="For instance: pommel will not draw">
        <TextInput value={title} required onChange={(event) => setTitle(event.target.value)} />
      </Field>
      <Field label="What you saw" optional>
        <TextArea value={words} onChange={(event) => setWords(event.target.value)} />
      </Field>
      {open.length > 0 && (
        <Checkbox
          label="Work cannot go on until this is settled"
          checked={blocking}
          onChange={(event) => setBlocking(event.target.checked)}
        />
      )}
      {holds && (
        <Field label="Which leg it holds">
          <Select value={heldLegId} onChange={(event) => setHeldLegId(event.target.value)}>
            {open.map((leg) => (
              <option key={leg.id} value={leg.id}>
                {leg.title}
              </option>
            ))}
          </Select>
        </Field>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={raise.pending}>
          Raise the report
        </Button>
        {(title !== '' || words !== '') && <span className="text-note text-lead-grey">draft kept</span>}
      </div>
      <ProblemNotice problem={raise.problem} />
    </form>
  );
}
