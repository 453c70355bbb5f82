import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface MeasureTableProps {
  /** What the figures are for; stamped above them: "To reach a hand-slip fit". */
  caption: ReactNode;
  /** `MeasureRow`s. */
  children: ReactNode;
}

/** Labels at the left, figures in one column at the right. */
export function MeasureTable({ caption, children }: MeasureTableProps) {
  return (
    <table className="w-full border-collapse">
      <caption className="px-2 pb-1.5 text-left text-lead-grey stamped">{caption}</caption>
      <tbody className="border-t border-hairline">{children}</tbody>
    </table>
  );
}

export interface MeasureRowProps {
  label: ReactNode;
  /** Figure with its unit, set in one width per figure: "0.118 mm". */
  value: ReactNode;
  /** Value as it was entered, shown on hover: "1.2582 in". */
  enteredAs?: string;
  /** The row the table is there for. One per table. */
  emphasised?: boolean;
  /** The figure breaks a limit; the words of the row or a stamp say so too. */
  tone?: 'plain' | 'oxide' | 'verdigris';
}

const VALUE_TONES = { plain: '', oxide: 'text-oxide', verdigris: 'text-verdigris' };

export function MeasureRow({ label, value, enteredAs, emphasised = false, tone = 'plain' }: MeasureRowProps) {
  return (
    <tr className="border-b border-hairline align-baseline">
      <th scope="row" className={joinClasses('px-2 py-1.5 text-left', emphasised ? 'font-bold' : 'font-normal')}>
        {label}
      </th>
      <td
        title={enteredAs}
        className={joinClasses('px-2 py-1.5 text-right figures', emphasised && 'font-bold', VALUE_TONES[tone])}
      >
        {value}
      </td>
    </tr>
  );
}
