import type { ComponentProps } from 'react';
import { CONTROL_CLASS, useFieldWiring } from './field-context.ts';
import { joinClasses } from './join-classes.ts';

/** The device's own list: it knows thumbs, keyboards and readers best. Options are given as children. */
export function Select({ className, children, ...rest }: ComponentProps<'select'>) {
  return (
    <div className="relative">
      <select
        {...rest}
        {...useFieldWiring(rest)}
        className={joinClasses(CONTROL_CLASS, 'appearance-none pr-10', className)}
      >
        {children}
      </select>
      <svg
        aria-hidden
        viewBox="0 0 16 16"
        className="pointer-events-none absolute top-1/2 right-3 size-4 -translate-y-1/2 fill-none stroke-soot"
        strokeWidth="1.6"
      >
        <path d="m3 6 5 5 5-5" />
      </svg>
    </div>
  );
}
