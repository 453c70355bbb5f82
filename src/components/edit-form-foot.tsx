import type { Conflict } from '../hooks/use-edit-form.ts';
import type { ApiProblem } from '../lib/api.ts';
import { ConflictSheet } from './conflict-sheet.tsx';
import { ProblemNotice } from './problem-notice.tsx';
import { Button } from './ui/button.tsx';

interface EditFormFootProps {
  form: {
    act: { pending: boolean; problem: ApiProblem | null };
    isDraft: boolean;
    forget: () => void;
    conflict: Conflict | null;
  };
  /** What the button says it saves. */
  save: string;
}

/** The end of every form that changes a record: save, leave as it was, and what stands in the way. */
export function EditFormFoot({ form, save }: EditFormFootProps) {
  return (
    <>
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" variant="outline" busy={form.act.pending} disabled={!form.isDraft}>
          {save}
        </Button>
        {form.isDraft && (
          <>
            <span className="text-note text-lead-grey">draft kept</span>
            <Button variant="quiet" onClick={form.forget}>
              Leave it as it was
            </Button>
          </>
        )}
      </div>
      {form.conflict ? <ConflictSheet conflict={form.conflict} /> : <ProblemNotice problem={form.act.problem} />}
    </>
  );
}
