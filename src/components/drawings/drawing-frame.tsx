import { useId } from 'react';
import type { ReactNode, Ref } from 'react';

export interface DrawingFrameProps {
  title: string;
  /** The drawing in words, for those who do not see it; the same facts, no more. */
  description: string;
  widthPx: number;
  heightPx: number;
  /** Scale and what is exaggerated; set below the drawing. */
  scaleNote: ReactNode;
  containerRef: Ref<HTMLElement>;
  children: ReactNode;
}

/** A figure with its drawing, text equivalent and scale. */
export function DrawingFrame(props: DrawingFrameProps) {
  const { title, description, widthPx, heightPx, scaleNote, containerRef, children } = props;
  const id = useId();
  return (
    <figure ref={containerRef} className="min-w-0 overflow-hidden">
      <svg
        role="img"
        aria-labelledby={`${id}-title ${id}-words`}
        width={widthPx}
        height={heightPx}
        viewBox={`0 0 ${widthPx} ${heightPx}`}
        className="block h-auto max-w-full overflow-visible font-sans"
      >
        <title id={`${id}-title`}>{title}</title>
        <desc id={`${id}-words`}>{description}</desc>
        {children}
      </svg>
      <figcaption className="mt-1 text-note text-lead-grey">{scaleNote}</figcaption>
    </figure>
  );
}
