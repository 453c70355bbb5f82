import type { ReactNode } from 'react';

export interface EmptyStateProps {
  /** What will be here. */
  title: ReactNode;
  children?: ReactNode;
  /** The first act. */
  action?: ReactNode;
}

export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 border border-dashed border-edge px-4 py-5">
      <p className="font-semibold">{title}</p>
      {children && <div className="max-w-words text-note text-lead-grey">{children}</div>}
      {action}
    </div>
  );
}
