import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface FoldProps {
  summary: ReactNode;
  /** An act of some weight, as offering another day. */
  strong?: boolean;
  /** Open from the start. */
  open?: boolean;
  children: ReactNode;
}

/** What is out of sight until it is asked for, by the browser's own means. */
export function Fold({ summary, strong = false, open = false, children }: FoldProps) {
  return (
    <details open={open || undefined}>
      <summary
        className={joinClasses('min-h-thumb cursor-pointer py-2', strong ? 'font-semibold text-brass' : 'text-note')}
      >
        {summary}
      </summary>
      {children}
    </details>
  );
}
