import { useId, useRef } from 'react';
import type { ChangeEvent, ReactNode } from 'react';
import { buttonClass } from './button-class.ts';
import type { ButtonVariant } from './button-class.ts';
import { joinClasses } from './join-classes.ts';

export interface FilePickerProps {
  /** The act: "Add photographs". */
  children: ReactNode;
  onFiles: (files: File[]) => void;
  /** As the input's `accept`: "image/*". */
  accept?: string;
  multiple?: boolean;
  /** Opens a phone's camera at once; 'environment' is the one at its back. */
  capture?: 'environment' | 'user';
  variant?: ButtonVariant;
  disabled?: boolean;
  describedBy?: string;
}

/** A native file input under the looks of a button: keyboard, camera and reader find what they know. */
export function FilePicker({
  children,
  onFiles,
  accept,
  multiple = false,
  capture,
  variant = 'outline',
  disabled,
  describedBy,
}: FilePickerProps) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const handleChange = (event: ChangeEvent<HTMLInputElement>) => {
    const files = [...(event.currentTarget.files ?? [])];
    if (files.length > 0) onFiles(files);
    // The same file can be picked again after it failed.
    if (input.current) input.current.value = '';
  };
  return (
    <span className="relative inline-flex">
      <input
        ref={input}
        id={id}
        type="file"
        accept={accept}
        multiple={multiple}
        capture={capture}
        disabled={disabled}
        aria-describedby={describedBy}
        onChange={handleChange}
        className="peer sr-only"
      />
      <label
        htmlFor={id}
        className={joinClasses(
          buttonClass(variant),
          'cursor-pointer peer-focus-visible:outline-2 peer-focus-visible:outline-offset-2 peer-focus-visible:outline-gun-blue peer-disabled:cursor-not-allowed peer-disabled:opacity-55',
        )}
      >
        {children}
      </label>
    </span>
  );
}
