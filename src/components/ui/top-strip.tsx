import { useId, useRef, useState } from 'react';
import type { KeyboardEvent, MouseEvent, ReactNode } from 'react';
import { BrandMark, Wordmark } from './brand-mark.tsx';
import { joinClasses } from './join-classes.ts';

/** Looks of a link in the strip; `current` is underlined in brass and needs `aria-current="page"` on the link. */
export const stripLinkClass = (current: boolean): string =>
  joinClasses(
    'inline-flex min-h-thumb items-center border-b-2 whitespace-nowrap no-underline',
    current ? 'border-brass font-semibold' : 'border-transparent hover:border-hairline',
  );

export interface TopStripProps {
  /** Wraps mark and name in the link home: `(mark) => <Link to="/" className="...">{mark}</Link>`. */
  homeLink: (mark: ReactNode) => ReactNode;
  /** Links, each with `stripLinkClass`. */
  nav?: ReactNode;
  search?: ReactNode;
  notices?: ReactNode;
  /** The person's menu or the link to sign in. */
  person?: ReactNode;
}

/** Name, places, search, notices, person. On a phone or tablet: name and one button that opens the rest. */
export function TopStrip({ homeLink, nav, search, notices, person }: TopStripProps) {
  const [open, setOpen] = useState(false);
  const panelId = useId();
  const opener = useRef<HTMLButtonElement>(null);
  const handleKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.key !== 'Escape' || !open) return;
    setOpen(false);
    opener.current?.focus();
  };
  const closeAfterLink = (event: MouseEvent<HTMLElement>) => {
    if ((event.target as Element).closest('a')) setOpen(false);
  };
  const hasPanel = Boolean(nav ?? search ?? notices ?? person);
  return (
    <header className="border-b border-hairline bg-vellum print:hidden" onKeyDown={handleKeyDown}>
      <div
        className="mx-auto flex max-w-page flex-wrap items-center gap-x-6 px-4 lg:flex-nowrap md:px-7"
        onClick={closeAfterLink}
        onSubmit={() => setOpen(false)}
      >
        <div className="flex min-h-14 flex-none items-center">
          {homeLink(
            <span className="flex min-h-thumb items-center gap-2.5">
              <BrandMark />
              <Wordmark />
            </span>,
          )}
        </div>
        {hasPanel && (
          <button
            ref={opener}
            type="button"
            aria-expanded={open}
            aria-controls={panelId}
            onClick={() => setOpen(!open)}
            className="-mr-2 ml-auto min-h-thumb px-2 font-semibold lg:hidden"
          >
            {open ? 'Close' : 'Menu'}
          </button>
        )}
        <div
          id={panelId}
          className={joinClasses(
            'w-full flex-col gap-3 pb-4 lg:flex lg:min-w-0 lg:flex-row lg:items-center lg:gap-6 lg:py-2 lg:pb-2',
            open ? 'flex' : 'hidden',
          )}
        >
          {nav && (
            <nav aria-label="Places" className="flex flex-col lg:flex-row lg:gap-6">
              {nav}
            </nav>
          )}
          {search && <div className="lg:max-w-md lg:min-w-40 lg:flex-1">{search}</div>}
          <div className="flex items-center justify-between gap-6 lg:ml-auto">
            {notices}
            {person}
          </div>
        </div>
      </div>
    </header>
  );
}

/** Lets a keyboard pass the strip; it shows when it has the focus. */
export function SkipLink({ target }: { target: string }) {
  return (
    <a
      href={`#${target}`}
      className="sr-only rounded border border-brass bg-vellum px-4 py-3 font-semibold focus:not-sr-only focus:absolute focus:top-2 focus:left-2 focus:z-50"
    >
      Skip to the page
    </a>
  );
}
