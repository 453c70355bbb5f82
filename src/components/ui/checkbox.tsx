import { useId } from 'react';
import type { ComponentProps, ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface CheckboxProps extends Omit<ComponentProps<'input'>, 'type' | 'children'> {
  label: ReactNode;
  hint?: ReactNode;
  error?: ReactNode;
}

export function Checkbox({ label, hint, error, className, id: ownId, ...rest }: CheckboxProps) {
  const made = useId();
  const id = ownId ?? made;
  const describedBy = [hint ? `${id}-hint` : null, error ? `${id}-error` : null].filter(Boolean).join(' ') || undefined;
  return (
    <div className={joinClasses('flex flex-col', className)}>
      <label htmlFor={id} className="flex min-h-thumb items-start gap-3 py-2.5">
        <input
          {...rest}
          id={id}
          type="checkbox"
          aria-describedby={describedBy}
          aria-invalid={error ? true : undefined}
          className="tick mt-px"
        />
        <span className="leading-normal">{label}</span>
      </label>
      {hint && (
        <p id={`${id}-hint`} className="-mt-1.5 pl-8.5 text-note text-lead-grey">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="pl-8.5 text-note font-medium text-oxide">
          {error}
        </p>
      )}
    </div>
  );
}
