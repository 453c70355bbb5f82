import { joinClasses } from './join-classes.ts';

export type ButtonVariant = 'primary' | 'outline' | 'quiet' | 'danger';

const SHARED =
  'inline-flex min-h-thumb items-center justify-center gap-2 rounded border px-4 py-2 text-center text-body leading-tight font-semibold select-none transition-colors disabled:opacity-55 aria-disabled:opacity-70 print:hidden';

const VARIANTS: Record<ButtonVariant, string> = {
  primary:
    'border-brass bg-brass text-on-brass no-underline not-disabled:not-aria-disabled:hover:border-brass-deep not-disabled:not-aria-disabled:hover:bg-brass-deep',
  outline:
    'border-brass bg-vellum text-brass no-underline not-disabled:not-aria-disabled:hover:bg-bone not-disabled:not-aria-disabled:hover:text-brass-deep',
  quiet:
    'border-transparent text-soot underline decoration-edge underline-offset-4 not-disabled:not-aria-disabled:hover:decoration-2',
  danger:
    'border-oxide bg-oxide text-on-oxide no-underline not-disabled:not-aria-disabled:hover:border-oxide-deep not-disabled:not-aria-disabled:hover:bg-oxide-deep',
};

/** Looks of a button, also for a link that leads straight to an act (`<Link className={buttonClass('primary')}>`). */
export const buttonClass = (variant: ButtonVariant = 'outline', extra?: string): string =>
  joinClasses(SHARED, VARIANTS[variant], extra);
