import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';
import { TONE_TEXT } from './tone.ts';
import type { Tone } from './tone.ts';

export interface StampProps {
  tone?: Tone;
  children: ReactNode;
  className?: string;
}

/** A small outlined label, as stamped on a document. Its words carry the meaning, the tone only repeats it. */
export function Stamp({ tone = 'neutral', children, className }: StampProps) {
  return (
    <span
      className={joinClasses(
        'inline-block rounded border border-current px-1.5 py-0.5 text-note leading-tight font-medium',
        TONE_TEXT[tone],
        className,
      )}
    >
      {children}
    </span>
  );
}
