/** A reason to end that is written for the person at the terminal: shown as it is, without a stack. */
export class Halt extends Error {}

/** @param {string} line */
export const say = (line) => void process.stdout.write(`${line}\n`);

/**
 * What to show of anything thrown.
 * @param {unknown} thrown
 * @returns {string}
 */
export function wordsOf(thrown) {
  if (thrown instanceof Halt) return thrown.message;
  return thrown instanceof Error ? (thrown.stack ?? thrown.message) : String(thrown);
}
