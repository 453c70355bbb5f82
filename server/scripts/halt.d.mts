/**
 * What to show of anything thrown.
 * @param {unknown} thrown
 * @returns {string}
 */
export function wordsOf(thrown: unknown): string;
/** A reason to end that is written for the person at the terminal: shown as it is, without a stack. */
export class Halt extends Error {}
export function say(line: string): undefined;
