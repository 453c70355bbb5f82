import { useId } from 'react';
import type { ReactNode } from 'react';
import { FieldContext } from './field-context.ts';
import { joinClasses } from './join-classes.ts';

export interface FieldProps {
  label: ReactNode;
  /** What helps to fill it in, shown before a mistake is made. */
  hint?: ReactNode;
  /** What is wrong and what to do; read out with the control. */
  error?: ReactNode;
  /** Says "optional" beside the label. Most fields are needed, so the exception is what is marked. */
  optional?: boolean;
  required?: boolean;
  className?: string;
  /** One control of this folder, or one that calls `useFieldWiring`. */
  children: ReactNode;
}

/** Label, hint and error of one control, tied to it for those who do not see them beside each other. */
export function Field({ label, hint, error, optional, required = false, className, children }: FieldProps) {
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const describedBy = [hint ? hintId : null, error ? errorId : null].filter(Boolean).join(' ') || undefined;
  return (
    <div className={joinClasses('flex flex-col gap-1.5', className)}>
      <label htmlFor={id} className="text-note font-semibold">
        {label}
        {optional && (
          <>
            {' '}
            <span className="font-normal text-lead-grey">(optional)</span>
          </>
        )}
      </label>
      {hint && (
        <p id={hintId} className="text-note text-lead-grey">
          {hint}
        </p>
      )}
      <FieldContext value={{ id, describedBy, invalid: Boolean(error), required }}>{children}</FieldContext>
      {error && (
        <p id={errorId} className="flex gap-2 text-note font-medium text-oxide">
          <ErrorMark />
          <span>{error}</span>
        </p>
      )}
    </div>
  );
}

/** So that the colour is not the only sign. */
function ErrorMark() {
  return (
    <svg aria-hidden viewBox="0 0 16 16" className="mt-0.5 size-4 flex-none fill-none stroke-current" strokeWidth="1.6">
      <path d="M8 1.6 15 14.2H1Z" strokeLinejoin="round" />
      <path d="M8 6v4M8 11.4v1.3" />
    </svg>
  );
}
