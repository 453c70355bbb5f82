import { useSyncExternalStore } from 'react';
import { currentAnnouncement, onAnnouncement } from './announcer.ts';

/** Speaks what `announce` is given. The shell mounts it once; it must be on the page before the first message. */
export function LiveRegion() {
  const { words, manner, nth } = useSyncExternalStore(onAnnouncement, currentAnnouncement);
  return (
    <div className="sr-only">
      <div role="status">{manner === 'polite' && <span key={nth}>{words}</span>}</div>
      <div role="alert">{manner === 'assertive' && <span key={nth}>{words}</span>}</div>
    </div>
  );
}
