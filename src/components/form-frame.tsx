import { useEffect, useRef, type ReactNode } from 'react';
import type { ApiProblem } from '../lib/api.ts';
import { joinClasses } from './ui/join-classes.ts';

/** A form that is sent by its own act and never by the browser. A finding brings the reader to the field it is about. */
export function FormFrame({
  form,
  className,
  children,
}: {
  form: { submit: () => void; act: { problem: ApiProblem | null } };
  className?: string;
  children: ReactNode;
}) {
  const frame = useRef<HTMLFormElement>(null);
  const { problem } = form.act;
  useEffect(() => {
    if (problem?.problem.errors) frame.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [problem]);
  return (
    <form
      ref={frame}
      className={joinClasses('grid gap-4', className)}
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      {children}
    </form>
  );
}
