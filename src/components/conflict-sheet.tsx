import type { Conflict } from '../hooks/use-edit-form.ts';
import { Button } from './ui/button.tsx';
import { Notice } from './ui/notice.tsx';

/** Somebody saved in the meantime: both values of each field side by side, and nothing of either is lost. */
export function ConflictSheet({ conflict }: { conflict: Conflict }) {
  const { differences, saveMine } = conflict;
  return (
    <Notice kind="alert" tone="oxide" title="Someone saved this after you opened it">
      <p>Nothing of yours was saved or lost. Compare, take what is better, and save again.</p>
      {differences.length === 0 && <p>Your values are the same as theirs by now.</p>}
      <ul className="grid gap-3 pt-3">
        {differences.map(({ name, label, mine, theirs, takeTheirs }) => (
          <li key={name} className="grid gap-2 border-t border-hairline pt-2 sm:grid-cols-[8rem_1fr_1fr_auto]">
            <span className="font-semibold">{label}</span>
            <span className="wrap-anywhere">
              <span className="stamped text-stamp text-lead-grey">Yours</span>
              <br />
              {mine}
            </span>
            <span className="wrap-anywhere">
              <span className="stamped text-stamp text-lead-grey">Saved now</span>
              <br />
              {theirs}
            </span>
            <Button variant="outline" onClick={takeTheirs} aria-label={`Take theirs: ${label}`}>
              Take theirs
            </Button>
          </li>
        ))}
      </ul>
      <div className="pt-3">
        <Button onClick={saveMine}>Save what stands in the form</Button>
      </div>
    </Notice>
  );
}
