import { useState } from 'react';
import type { ChangeEvent, ComponentProps } from 'react';
import { weekdayOf } from './day-words.ts';
import { CONTROL_CLASS, useFieldWiring } from './field-context.ts';
import { joinClasses } from './join-classes.ts';

/** The device's own date field, with the weekday said beside it: a wrong weekday is how a wrong date is noticed. */
export function DateInput({ className, onChange, ...rest }: Omit<ComponentProps<'input'>, 'type'>) {
  const [typed, setTyped] = useState(String(rest.defaultValue ?? ''));
  const weekday = weekdayOf(rest.value === undefined ? typed : String(rest.value));
  const handleChange = (event: ChangeEvent<HTMLInputElement>) => {
    setTyped(event.currentTarget.value);
    onChange?.(event);
  };
  return (
    <div className="flex items-center gap-3">
      <input
        {...rest}
        {...useFieldWiring(rest)}
        type="date"
        onChange={handleChange}
        className={joinClasses(CONTROL_CLASS, 'max-w-48 figures', className)}
      />
      <output aria-live="polite" className="text-note text-lead-grey">
        {weekday}
      </output>
    </div>
  );
}
