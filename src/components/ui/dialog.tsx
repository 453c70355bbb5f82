import { Dialog as RadixDialog } from 'radix-ui';
import { useRef } from 'react';
import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  description?: ReactNode;
  /** Buttons of the act and of leaving; the act comes first. */
  actions?: ReactNode;
  width?: 'narrow' | 'wide';
  children?: ReactNode;
}

/**
 * A question that must be answered before going on. The focus stays inside, Escape leaves, the focus returns.
 * The backdrop is a plain element: the library's own overlay writes a style sheet into the page, which the
 * Content-Security-Policy refuses; base.css keeps the page behind from scrolling instead.
 */
export function Dialog({ open, onOpenChange, title, description, actions, width = 'narrow', children }: DialogProps) {
  const opener = useRef<Element | null>(null);
  return (
    <RadixDialog.Root open={open} onOpenChange={onOpenChange}>
      <RadixDialog.Portal>
        <div data-dialog-backdrop="" className="fixed inset-0 z-40 bg-veil/55" />
        <RadixDialog.Content
          // The library gives the focus back to a trigger of its own only; ours is whatever was pressed.
          onOpenAutoFocus={() => {
            opener.current = document.activeElement;
          }}
          onCloseAutoFocus={(event) => {
            event.preventDefault();
            focusAgain(opener.current);
          }}
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={joinClasses(
            'fixed z-50 flex max-h-[calc(100dvh-2rem)] flex-col overflow-y-auto rounded border border-edge bg-vellum px-5 py-5',
            'inset-x-4 top-1/2 mx-auto -translate-y-1/2',
            width === 'narrow' ? 'max-w-lg' : 'max-w-3xl',
          )}
        >
          <RadixDialog.Title className="pr-12 text-head">{title}</RadixDialog.Title>
          {description && (
            <RadixDialog.Description className="mt-1 text-body text-lead-grey">{description}</RadixDialog.Description>
          )}
          {children && <div className="mt-4">{children}</div>}
          {actions && <div className="mt-5 flex flex-wrap gap-2">{actions}</div>}
          <RadixDialog.Close
            aria-label="Close"
            className="absolute top-2.5 right-2.5 flex size-11 items-center justify-center rounded text-lead-grey hover:text-soot"
          >
            <svg aria-hidden viewBox="0 0 16 16" className="size-4 fill-none stroke-current" strokeWidth="1.8">
              <path d="m3 3 10 10M13 3 3 13" />
            </svg>
          </RadixDialog.Close>
        </RadixDialog.Content>
      </RadixDialog.Portal>
    </RadixDialog.Root>
  );
}

/** What was pressed may be gone, as a row that was answered; then the page itself takes the focus. */
function focusAgain(opener: Element | null): void {
  const target = opener?.isConnected ? opener : document.querySelector('main');
  if (target instanceof HTMLElement) target.focus();
}
