import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface PageProps {
  /** 'full' for rooms with drawings, 'column' for one column to read or fill in, as the client's window. */
  width?: 'full' | 'column';
  id?: string;
  children: ReactNode;
}

/** The page below the strip: at most 1440 px wide, gutters of 16 px on a phone and 28 px beyond. */
export function Page({ width = 'full', id = 'page', children }: PageProps) {
  return (
    <main
      id={id}
      tabIndex={-1}
      className={joinClasses(
        'mx-auto flex flex-col gap-4 px-4 pt-5 pb-16 md:gap-5 md:px-7 print:p-0',
        width === 'full' ? 'max-w-page' : 'max-w-3xl',
      )}
    >
      {children}
    </main>
  );
}

export interface PageHeadingProps {
  /** The stamped line above: "Commission 7Q4M K2X9 · for Orla Penhallow". */
  stampedLine?: ReactNode;
  title: ReactNode;
  /** One sentence that says where things stand. */
  headline?: ReactNode;
  /** Acts on the whole page. */
  actions?: ReactNode;
  /** The shell moves the focus here after navigation. */
}

export function PageHeading({ stampedLine, title, headline, actions }: PageHeadingProps) {
  return (
    <header className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
      <div className="flex min-w-0 flex-col gap-1.5">
        {stampedLine && <p className="text-lead-grey stamped">{stampedLine}</p>}
        <h1 tabIndex={-1} className="text-title tracking-tight">
          {title}
        </h1>
        {headline && <p className="max-w-4xl text-lead text-pretty">{headline}</p>}
      </div>
      {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
    </header>
  );
}

/** The reader's room: what is worked on at the left (58 %), what goes with it at the right; one column on a phone. */
export function TwoColumns({ main, side }: { main: ReactNode; side: ReactNode }) {
  return (
    <div className="grid gap-4 md:gap-5 lg:grid-cols-[minmax(0,58fr)_minmax(0,42fr)] print:block">
      <div className="flex min-w-0 flex-col gap-4 md:gap-5">{main}</div>
      <div className="flex min-w-0 flex-col gap-4 md:gap-5">{side}</div>
    </div>
  );
}
