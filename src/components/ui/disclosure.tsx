import { useEffect, useId, useRef, useState, type ReactNode } from 'react';

export interface DisclosureProps {
  /** On the button. */
  label: ReactNode;
  buttonClassName: string;
  children: ReactNode;
}

/**
 * A button that opens a small panel below itself; Escape, a press elsewhere and a link within close it. The page stays
 * readable behind it, and the order of the focus is that of the page.
 */
export function Disclosure({ label, buttonClassName, children }: DisclosureProps) {
  const [open, setOpen] = useState(false);
  const frame = useRef<HTMLDivElement>(null);
  const opener = useRef<HTMLButtonElement>(null);
  const panelId = useId();
  useEffect(() => {
    if (!open) return;
    const closeOutside = (event: Event): void => {
      if (event.target instanceof Node && !frame.current?.contains(event.target)) setOpen(false);
    };
    document.addEventListener('pointerdown', closeOutside);
    document.addEventListener('focusin', closeOutside);
    return () => {
      document.removeEventListener('pointerdown', closeOutside);
      document.removeEventListener('focusin', closeOutside);
    };
  }, [open]);
  return (
    <div
      ref={frame}
      className="relative"
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || !open) return;
        event.stopPropagation();
        setOpen(false);
        opener.current?.focus();
      }}
    >
      <button
        ref={opener}
        type="button"
        aria-expanded={open}
        aria-controls={panelId}
        className={buttonClassName}
        onClick={() => setOpen(!open)}
      >
        {label}
      </button>
      <div
        id={panelId}
        hidden={!open}
        onClick={(event) => {
          if ((event.target as Element).closest('a')) setOpen(false);
        }}
        className="absolute right-0 z-40 w-64 max-w-[calc(100vw-2rem)] rounded border border-edge bg-vellum p-2"
      >
        {children}
      </div>
    </div>
  );
}
