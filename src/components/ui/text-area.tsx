import { useLayoutEffect, useRef } from 'react';
import type { ComponentProps, FormEvent, Ref } from 'react';
import { CONTROL_FACE, useFieldWiring } from './field-context.ts';
import { joinClasses } from './join-classes.ts';

export interface TextAreaProps extends ComponentProps<'textarea'> {
  /** Rows shown when empty; it grows with what is written. */
  rows?: number;
}

const growsByItself = (area: HTMLTextAreaElement): boolean => 'fieldSizing' in area.style;

function fitToContent(area: HTMLTextAreaElement): void {
  if (growsByItself(area)) return;
  area.style.height = 'auto';
  area.style.height = `${area.scrollHeight + 2}px`;
}

/** A text field that is always as tall as its text, up to about half of the screen. */
export function TextArea({ className, rows = 3, ref, onInput, ...rest }: TextAreaProps) {
  const own = useRef<HTMLTextAreaElement | null>(null);
  useLayoutEffect(() => {
    if (own.current) fitToContent(own.current);
  }, [rest.value]);

  const setRef = (node: HTMLTextAreaElement | null) => {
    own.current = node;
    return passOn(ref, node);
  };
  const handleInput = (event: FormEvent<HTMLTextAreaElement>) => {
    fitToContent(event.currentTarget);
    onInput?.(event as Parameters<NonNullable<typeof onInput>>[0]);
  };
  return (
    <textarea
      {...rest}
      {...useFieldWiring(rest)}
      ref={setRef}
      rows={rows}
      onInput={handleInput}
      className={joinClasses(
        CONTROL_FACE,
        'field-sizing-content min-h-24 max-h-[50vh] resize-y leading-normal',
        className,
      )}
    />
  );
}

function passOn<T>(ref: Ref<T> | undefined, node: T | null): void {
  if (typeof ref === 'function') ref(node);
  else if (ref) ref.current = node;
}
