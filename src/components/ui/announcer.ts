/** A message for those who listen rather than look; `assertive` only where work would be lost otherwise. */
export interface Announcement {
  words: string;
  manner: 'polite' | 'assertive';
  /** Counts up, so that the same words twice are two messages. */
  nth: number;
}

let latest: Announcement = { words: '', manner: 'polite', nth: 0 };
const listeners = new Set<() => void>();

/** Says a status message through the page's one `LiveRegion` (WCAG 4.1.3) without moving the focus. */
export function announce(words: string, manner: Announcement['manner'] = 'polite'): void {
  latest = { words, manner, nth: latest.nth + 1 };
  for (const listener of listeners) listener();
}

export const currentAnnouncement = (): Announcement => latest;

export function onAnnouncement(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
