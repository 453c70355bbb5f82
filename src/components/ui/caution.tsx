import type { ReactNode } from 'react';

/** A line where work can hurt someone: in place, never a wall to click through. */
export function Caution({ children }: { children: ReactNode }) {
  return (
    <p className="border-l-3 border-oxide py-1 pl-3 text-note">
      <span className="sr-only">Caution: </span>
      {children}
    </p>
  );
}
