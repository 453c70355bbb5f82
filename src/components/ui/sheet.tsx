import { useId } from 'react';
import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface SheetProps {
  title: ReactNode;
  /** Small words after the title, as who wrote it and when. */
  note?: ReactNode;
  /** A `Stamp` or a quiet button at the right of the title. */
  stamp?: ReactNode;
  headingLevel?: 2 | 3 | 4;
  id?: string;
  className?: string;
  children: ReactNode;
}

/** A sheet of the shop document: hairline, title, content. It has no shadow. */
export function Sheet({ title, note, stamp, headingLevel = 2, id, className, children }: SheetProps) {
  const headingId = useId();
  const Heading = `h${headingLevel}` as const;
  return (
    <section
      id={id}
      aria-labelledby={headingId}
      className={joinClasses(
        '@container min-w-0 rounded border border-hairline bg-vellum px-4 py-4 sm:px-5 print:border-edge',
        className,
      )}
    >
      <header className="mb-3 flex flex-wrap items-start justify-between gap-x-4 gap-y-1.5">
        <div className="flex flex-wrap items-baseline gap-x-2">
          <Heading id={headingId} className="text-head">
            {title}
          </Heading>
          {note && <p className="text-note font-medium text-lead-grey">{note}</p>}
        </div>
        {stamp}
      </header>
      {children}
    </section>
  );
}
