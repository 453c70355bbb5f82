import type { ReactNode } from 'react';
import { joinClasses } from './ui/join-classes.ts';

/** A form that is sent by its own act and never by the browser. */
export function FormFrame({
  form,
  className,
  children,
}: {
  form: { submit: () => void };
  className?: string;
  children: ReactNode;
}) {
  return (
    <form
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
