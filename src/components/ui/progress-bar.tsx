import { useId } from 'react';
import type { ReactNode } from 'react';

export interface ProgressBarProps {
  /** What is being done: "Sending IMG_2041.jpg". */
  label: ReactNode;
  /** Bytes, files or pages done and in all; leave `total` out while it is not known. */
  done: number;
  total?: number;
  /** The figures in words, as "3.1 of 8.4 MB". */
  words?: ReactNode;
  state?: 'under-way' | 'done' | 'failed';
}

/** Real progress of long work, by the native element. */
export function ProgressBar({ label, done, total, words, state = 'under-way' }: ProgressBarProps) {
  const id = useId();
  return (
    <div className="flex flex-col gap-1.5">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 text-note">
        <label htmlFor={id} className="min-w-0 break-words">
          {label}
        </label>
        {words && <span className="text-lead-grey figures">{words}</span>}
      </div>
      <progress
        id={id}
        className="upload-bar"
        data-state={state}
        {...(total === undefined ? {} : { value: Math.min(done, total), max: total })}
      />
    </div>
  );
}
