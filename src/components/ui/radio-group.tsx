import { useId } from 'react';
import type { ReactNode } from 'react';

export interface RadioOption<Value extends string> {
  value: Value;
  label: ReactNode;
  hint?: ReactNode;
  disabled?: boolean;
}

export interface RadioGroupProps<Value extends string> {
  legend: ReactNode;
  name: string;
  options: readonly RadioOption<Value>[];
  value?: Value;
  defaultValue?: Value;
  onValueChange?: (value: Value) => void;
  hint?: ReactNode;
  error?: ReactNode;
  required?: boolean;
  /** Set beside each other where there is room, as for two or three short words. */
  inRow?: boolean;
}

/** One choice of a few, as native radios in a fieldset: arrow keys, required and form reset are the browser's own. */
export function RadioGroup<Value extends string>(props: RadioGroupProps<Value>) {
  const { legend, name, options, value, defaultValue, onValueChange, hint, error, required, inRow } = props;
  const id = useId();
  const describedBy = [hint ? `${id}-hint` : null, error ? `${id}-error` : null].filter(Boolean).join(' ') || undefined;
  return (
    <fieldset aria-describedby={describedBy} aria-invalid={error ? true : undefined} className="min-w-0">
      <legend className="text-note font-semibold">{legend}</legend>
      {hint && (
        <p id={`${id}-hint`} className="mt-1 text-note text-lead-grey">
          {hint}
        </p>
      )}
      <div className={inRow ? 'flex flex-wrap gap-x-6' : 'flex flex-col'}>
        {options.map((option) => (
          <div key={option.value}>
            <label className="flex min-h-thumb items-start gap-3 py-2.5">
              <input
                type="radio"
                name={name}
                value={option.value}
                disabled={option.disabled}
                required={required}
                aria-describedby={option.hint ? `${id}-${option.value}` : undefined}
                className="tick mt-px"
                onChange={() => onValueChange?.(option.value)}
                {...(value === undefined
                  ? { defaultChecked: defaultValue === option.value }
                  : { checked: value === option.value })}
              />
              <span className="leading-normal">{option.label}</span>
            </label>
            {option.hint && (
              <p id={`${id}-${option.value}`} className="-mt-1.5 pb-1.5 pl-8.5 text-note text-lead-grey">
                {option.hint}
              </p>
            )}
          </div>
        ))}
      </div>
      {error && (
        <p id={`${id}-error`} className="text-note font-medium text-oxide">
          {error}
        </p>
      )}
    </fieldset>
  );
}
