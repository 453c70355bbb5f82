import { useState } from 'react';
import type { ApiProblem } from '../lib/api.ts';
import { ProblemNotice } from './problem-notice.tsx';
import { Button } from './ui/button.tsx';
import { Dialog } from './ui/dialog.tsx';

interface AskFirstProps {
  /** On the button that opens the question. */
  label: string;
  title: string;
  /** What the act means and what stays. */
  description: string;
  /** On the button that does it, and on the one that does not. */
  act: string;
  keep: string;
  pending: boolean;
  problem: ApiProblem | null;
  onAct: () => void;
}

/** An act that takes something away: it is done after a question, and a refusal is told where it was asked. */
export function AskFirst({ label, title, description, act, keep, pending, problem, onAct }: AskFirstProps) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button variant="quiet" onClick={() => setOpen(true)}>
        {label}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={title}
        description={description}
        actions={
          <>
            <Button variant="danger" busy={pending} onClick={onAct}>
              {act}
            </Button>
            <Button variant="outline" onClick={() => setOpen(false)}>
              {keep}
            </Button>
          </>
        }
      >
        <ProblemNotice problem={problem} />
      </Dialog>
    </>
  );
}
