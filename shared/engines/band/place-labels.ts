import type { BandLabel } from './band-types.ts';

export interface WantedLabel {
  readonly x: number;
  readonly strong: string;
  readonly plain: string;
  readonly tone: BandLabel['tone'];
}

/** Below this many characters a label says nothing any more and goes to the next lane. */
const LEAST_CHARACTERS = 9;
const MOST_LANES = 4;

const shorten = (text: string, room: number): string =>
  text.length <= room ? text : room < 2 ? '' : `${text.slice(0, room - 1).trimEnd()}…`;

/**
 * Puts labels of one row into lanes so that none meets another: each starts at its x, takes the lowest lane where enough
 * of it fits before the next label there, and is shortened to that room.
 *
 * @param charactersAcross characters that fit the whole width
 */
export function placeLabels(wanted: readonly WantedLabel[], charactersAcross: number): BandLabel[] {
  const sorted = [...wanted].sort((one, other) => one.x - other.x);
  const lanes: number[] = sorted.map(() => 0);
  const endOfLane: number[] = [];
  const start = (label: WantedLabel, length: number): number =>
    Math.min(label.x * charactersAcross, Math.max(0, charactersAcross - Math.min(length, charactersAcross)));

  for (const [index, label] of sorted.entries()) {
    const length = full(label).length;
    let lane = 0;
    // A lane is free where its last label can still keep the least room before this one starts.
    while (lane < MOST_LANES - 1 && (endOfLane[lane] ?? -1) > start(label, Math.min(length, LEAST_CHARACTERS)))
      lane += 1;
    lanes[index] = lane;
    endOfLane[lane] = start(label, length) + Math.min(length, LEAST_CHARACTERS) + 1;
  }
  return sorted.map((label, index) => {
    const lane = lanes[index] ?? 0;
    const next = sorted.findIndex((_other, at) => at > index && lanes[at] === lane);
    const begin = start(label, full(label).length);
    const nextLabel = sorted[next];
    const limit = nextLabel ? start(nextLabel, full(nextLabel).length) - 1 : charactersAcross;
    const room = Math.max(0, Math.floor(limit - begin));
    const strong = shorten(label.strong, room);
    return {
      x: begin / charactersAcross,
      lane,
      strong,
      plain: shorten(label.plain, room - strong.length - 1),
      tone: label.tone,
      full: full(label),
    };
  });
}

const full = (label: WantedLabel): string => `${label.strong} ${label.plain}`.trim();
