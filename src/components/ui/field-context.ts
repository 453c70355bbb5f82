import { createContext, useContext } from 'react';

export interface FieldWiring {
  id: string;
  describedBy: string | undefined;
  invalid: boolean;
  required: boolean;
}

export const FieldContext = createContext<FieldWiring | null>(null);

interface ControlWiring {
  id?: string | undefined;
  'aria-describedby'?: string | undefined;
  'aria-invalid'?: boolean | 'true' | 'false' | 'grammar' | 'spelling' | undefined;
  required?: boolean | undefined;
}

/** What a control needs so that its label, hint and error belong to it; its own props come first, descriptions add up. */
export function useFieldWiring(own: ControlWiring): ControlWiring {
  const field = useContext(FieldContext);
  if (!field) return own;
  return {
    id: own.id ?? field.id,
    'aria-describedby': [own['aria-describedby'], field.describedBy].filter(Boolean).join(' ') || undefined,
    'aria-invalid': own['aria-invalid'] ?? (field.invalid || undefined),
    required: own.required ?? (field.required || undefined),
  };
}

/** Looks of a control without its height, for one that grows. */
export const CONTROL_FACE =
  'w-full rounded border border-edge bg-vellum px-3 py-2 text-body text-soot hover:border-soot aria-invalid:border-oxide aria-invalid:border-2 disabled:bg-bone disabled:text-lead-grey [&[readonly]]:bg-bone';

/** Looks of a control of one line, as tall as a thumb needs. */
export const CONTROL_CLASS = `${CONTROL_FACE} min-h-thumb`;
