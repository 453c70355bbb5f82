/**
 * @param {string} name
 * @returns {Promise<{ setNote(note: string): void, release(): Promise<void> } | null>} null when another process holds it
 */
export function takeExclusive(name: string): Promise<{
  setNote(note: string): void;
  release(): Promise<void>;
} | null>;
/**
 * @param {string} name
 * @returns {Promise<string>} the note of the process that holds the lock, or nothing
 */
export function noteOf(name: string): Promise<string>;
/**
 * Runs work while no other process holds the same lock; waits for its turn.
 * @template T
 * @param {string} name
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export function inTurn<T>(name: string, work: () => Promise<T>): Promise<T>;
