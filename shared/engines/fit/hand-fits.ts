/** A fit in plain words with the clearance on diameter that shops mean by it, micrometres. */
export interface HandFit {
  readonly name: string;
  readonly clearanceMinUm: number;
  readonly clearanceMaxUm: number;
  readonly words: string;
}

/** Common practice of the trade, without a published source; a joint's own range always wins. */
export const HAND_FITS: readonly HandFit[] = [
  { name: 'drops in', clearanceMinUm: 150, clearanceMaxUm: 400, words: 'Falls in under its own weight' },
  { name: 'slides by hand', clearanceMinUm: 80, clearanceMaxUm: 200, words: 'Slides freely without rattle' },
  { name: 'hand slip', clearanceMinUm: 50, clearanceMaxUm: 100, words: 'Draws by hand with light drag' },
  { name: 'firm push', clearanceMinUm: 10, clearanceMaxUm: 50, words: 'Needs a push, comes off by hand' },
  { name: 'press', clearanceMinUm: -40, clearanceMaxUm: -10, words: 'Pressed once, not drawn again' },
];
