import type { ComponentProps, MouseEvent } from 'react';
import { buttonClass } from './button-class.ts';
import type { ButtonVariant } from './button-class.ts';

export interface ButtonProps extends ComponentProps<'button'> {
  variant?: ButtonVariant;
  /** The act is on its way. The button keeps the focus and its width, and takes no second press. */
  busy?: boolean;
  /** What is said instead of the act while it is on its way, as "Sending the offer". */
  busyLabel?: string;
}

/** A button that says its act. It never submits a form unless `type="submit"` is given. */
export function Button({
  variant = 'primary',
  busy = false,
  busyLabel,
  type = 'button',
  className,
  onClick,
  children,
  ...rest
}: ButtonProps) {
  const handleClick = (event: MouseEvent<HTMLButtonElement>) => {
    if (busy) event.preventDefault();
    else onClick?.(event);
  };
  return (
    <button
      {...rest}
      type={type}
      aria-busy={busy || undefined}
      aria-disabled={busy || rest['aria-disabled']}
      className={buttonClass(variant, className)}
      onClick={handleClick}
    >
      {busy && <BusyMark />}
      {busy && busyLabel ? busyLabel : children}
    </button>
  );
}

/** A quarter ring that turns slowly; with reduced motion it stands still and the words alone say it. */
function BusyMark() {
  return (
    <svg aria-hidden viewBox="0 0 16 16" className="size-4 flex-none animate-spin motion-reduce:animate-none">
      <circle cx="8" cy="8" r="6" fill="none" stroke="currentColor" strokeWidth="2" strokeDasharray="26 12" />
    </svg>
  );
}
