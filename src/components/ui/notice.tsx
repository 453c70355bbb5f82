import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';
import type { Tone } from './tone.ts';

const RULES: Record<Tone, string> = {
  neutral: 'border-l-edge',
  verdigris: 'border-l-verdigris',
  brass: 'border-l-brass',
  'gun-blue': 'border-l-gun-blue',
  oxide: 'border-l-oxide',
};

export interface NoticeProps {
  /** 'alert' interrupts and is for what went wrong; 'status' waits its turn; 'none' is on the page from the start. */
  kind?: 'status' | 'alert' | 'none';
  tone?: Tone;
  title?: ReactNode;
  children?: ReactNode;
  /** Buttons that act on it. */
  actions?: ReactNode;
  className?: string;
}

/** A message in the flow of the page: what happened, what was kept, what to do. */
export function Notice({ kind = 'status', tone, title, children, actions, className }: NoticeProps) {
  const ownTone = tone ?? (kind === 'alert' ? 'oxide' : 'gun-blue');
  return (
    <div
      role={kind === 'none' ? undefined : kind}
      className={joinClasses(
        'rounded border border-l-4 border-hairline bg-vellum px-4 py-3',
        RULES[ownTone],
        className,
      )}
    >
      {title && <p className="font-semibold">{title}</p>}
      {children && <div className="text-body">{children}</div>}
      {actions && <div className="mt-3 flex flex-wrap gap-2">{actions}</div>}
    </div>
  );
}
