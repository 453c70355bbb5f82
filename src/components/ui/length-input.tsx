import type { ComponentProps, KeyboardEvent, ReactNode } from 'react';
import { announce } from './announcer.ts';
import { CONTROL_CLASS, useFieldWiring } from './field-context.ts';
import { joinClasses } from './join-classes.ts';

export interface LengthInputProps extends Omit<ComponentProps<'input'>, 'type' | 'inputMode'> {
  /** Unit of a bare number, shown at the right of the field: "mm", "in". */
  unit?: ReactNode;
  /** Called with what was typed when Enter ends the value; parsing is the caller's. */
  onValueEnd?: (typed: string) => void;
  /** Enter in the last length field of the group, so that the caller can add a row. */
  onLastEnter?: () => void;
}

/**
 * A length as it is typed: "31.957", "31,957 mm", "1 17/64 in". Digital calipers that act as a keyboard send digits
 * about 1 ms apart and then Enter, so Enter goes on to the next length field of the same `[data-length-group]` (or
 * form) and never submits. After the last field the focus stays: were it to land on a button, the caliper's next Enter
 * would press it.
 */
export function LengthInput({ unit, onValueEnd, onLastEnter, onKeyDown, className, ...rest }: LengthInputProps) {
  const handleKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    onKeyDown?.(event);
    if (event.key !== 'Enter' || event.nativeEvent.isComposing) return;
    event.preventDefault();
    const field = event.currentTarget;
    if (field.value.trim() !== '') announce(`${field.value.trim()} entered`);
    onValueEnd?.(field.value);
    const next = lengthFieldAfter(field);
    if (next) {
      next.focus();
      next.select();
    } else onLastEnter?.();
  };
  return (
    <div className="relative">
      <input
        autoComplete="off"
        autoCapitalize="none"
        spellCheck={false}
        enterKeyHint="next"
        {...rest}
        {...useFieldWiring(rest)}
        type="text"
        inputMode="decimal"
        data-length-field=""
        onKeyDown={handleKeyDown}
        className={joinClasses(CONTROL_CLASS, 'figures text-right', unit ? 'pr-11' : null, className)}
      />
      {unit && (
        <span className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-note text-lead-grey">
          {unit}
        </span>
      )}
    </div>
  );
}

function lengthFieldAfter(field: HTMLInputElement): HTMLInputElement | null {
  const group = field.closest<HTMLElement>('[data-length-group]') ?? field.form;
  const fields = [...(group?.querySelectorAll<HTMLInputElement>('input[data-length-field]:enabled') ?? [])];
  return fields[fields.indexOf(field) + 1] ?? null;
}
