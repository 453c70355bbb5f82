import { useLayoutEffect, useState } from 'react';
import type { RefObject } from 'react';

/**
 * Width of an element in CSS pixels, measured before the first paint and followed after it. Drawings are laid out at
 * their true size rather than scaled, so that words stay readable on a phone.
 */
export function useContainerWidth(container: RefObject<HTMLElement | null>, fallbackPx: number): number {
  const [widthPx, setWidthPx] = useState(fallbackPx);
  useLayoutEffect(() => {
    const element = container.current;
    if (!element || typeof ResizeObserver === 'undefined') return;
    const measure = () => {
      const measuredPx = Math.floor(element.getBoundingClientRect().width);
      if (measuredPx > 0) setWidthPx(measuredPx);
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, [container]);
  return widthPx;
}
