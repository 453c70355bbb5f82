import type { ComponentProps } from 'react';
import { CONTROL_CLASS, useFieldWiring } from './field-context.ts';
import { joinClasses } from './join-classes.ts';

export function TextInput({ className, type = 'text', ...rest }: ComponentProps<'input'>) {
  return <input {...rest} {...useFieldWiring(rest)} type={type} className={joinClasses(CONTROL_CLASS, className)} />;
}
