import { useNavigate } from 'react-router-dom';
import { dropHandoff, type HandoffView } from '../../../../shared/contracts/handoffs.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Fold } from '../../../components/ui/fold.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { keys } from '../../../lib/query-keys.ts';

/** The lead's way out of a handoff that will not come about. */
export function DropHandoff({ commissionId, handoff }: { commissionId: string; handoff: HandoffView }) {
  const navigate = useNavigate();
  const form = useContractForm(dropHandoff, {
    name: `drop-${handoff.id}`,
    initial: { words: '' },
    toInput: ({ words }) => ({
      params: { commissionId, handoffId: handoff.id },
      body: { revision: handoff.revision, words },
    }),
    stale: () => [
      keys.handoffs.lists(commissionId),
      keys.standing.detail(commissionId),
      keys.history.list(commissionId),
      keys.bench(),
    ],
    said: 'The handoff is dropped.',
    onDone: () => void navigate(`/commissions/${commissionId}/plan`, { replace: true }),
  });
  return (
    <Fold summary="Drop this handoff">
      <FormFrame form={form}>
        <Field
          label="Why it will not come about"
          hint="It leaves the plan and the client's dates; what was offered and agreed stays on record"
          required
          error={form.errorAt('words')}
        >
          <TextArea value={form.values.words} required onChange={(event) => form.set('words', event.target.value)} />
        </Field>
        <div>
          <Button type="submit" variant="danger" busy={form.act.pending}>
            Drop the handoff
          </Button>
        </div>
        <ProblemNotice problem={form.act.problem} />
      </FormFrame>
    </Fold>
  );
}
