import type { ReactNode } from 'react';
import { Button } from './ui/button.tsx';
import { Notice } from './ui/notice.tsx';

export interface ConflictField {
  name: string;
  label: string;
  mine: ReactNode;
  theirs: ReactNode;
  same: boolean;
  takeTheirs: () => void;
}

/** Somebody saved in the meantime: both values of each field side by side, and nothing of either is lost. */
export function ConflictSheet({ fields, onSaveMine }: { fields: readonly ConflictField[]; onSaveMine: () => void }) {
  const differing = fields.filter((field) => !field.same);
  return (
    <Notice kind="alert" tone="oxide" title="Someone saved this after you opened it">
      <p>Nothing of yours was saved or lost. Compare, take what is better, and save again.</p>
      {differing.length === 0 && <p>Your values are the same as theirs by now.</p>}
      <ul className="grid gap-3 pt-3">
        {differing.map((field) => (
          <li key={field.name} className="grid gap-2 border-t border-hairline pt-2 sm:grid-cols-[8rem_1fr_1fr_auto]">
            <span className="font-semibold">{field.label}</span>
            <span>
              <span className="stamped text-stamp text-lead-grey">Yours</span>
              <br />
              {field.mine}
            </span>
            <span>
              <span className="stamped text-stamp text-lead-grey">Saved now</span>
              <br />
              {field.theirs}
            </span>
            <Button variant="outline" onClick={field.takeTheirs}>
              Take theirs
            </Button>
          </li>
        ))}
      </ul>
      <div className="pt-3">
        <Button onClick={onSaveMine}>Save what stands in the form</Button>
      </div>
    </Notice>
  );
}
