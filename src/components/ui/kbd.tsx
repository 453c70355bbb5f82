import type { ReactNode } from 'react';

export function Kbd({ children }: { children: ReactNode }) {
  return <kbd className="rounded border border-edge bg-bone px-1.5 py-0.5 text-note figures">{children}</kbd>;
}
