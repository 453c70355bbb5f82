import type { BandLabel } from './band-types.ts';

export interface WantedLabel {
  readonly x: number;
  readonly strong: string;
  readonly plain: string;
  readonly tone: BandLabel['tone'];
}

/** Below this many characters a label says nothing any more and goes to the next lane. */
const LEAST_CHARACTERS = 9;

const shorten = (text: string, room: number): string =>
  text.length <= room ? text : room < 2 ? '' : `${text.slice(0, room - 1).trimEnd()}…`;

const full = (label: WantedLabel): string => `${label.strong} ${label.plain}`.trim();

/**
 * Puts labels of one row into lanes so that none meets another: each starts at its x, or further left where it would run
 * over the right edge, takes the lowest lane where enough of it fits before the next label there, and is shortened to that
 * room. There are as many lanes as it takes, so that no label is lost on a crowded day.
 *
 * @param charactersAcross characters that fit the whole width
 */
export function placeLabels(wanted: readonly WantedLabel[], charactersAcross: number): BandLabel[] {
  const endOfLane: number[] = [];
  // By where they begin and not by x: a long label near the right edge begins before shorter ones that stand left of it.
  const placed = wanted
    .map((label) => {
      const { length } = full(label);
      const begin = Math.min(label.x * charactersAcross, Math.max(0, charactersAcross - length));
      return { label, begin, least: Math.min(length, LEAST_CHARACTERS) };
    })
    .sort((one, other) => one.begin - other.begin || one.label.x - other.label.x)
    .map((one) => {
      const free = endOfLane.findIndex((end) => end <= one.begin);
      const lane = free < 0 ? endOfLane.length : free;
      endOfLane[lane] = one.begin + one.least + 1;
      return { ...one, lane };
    });
  return placed.map(({ label, begin, lane }, index) => {
    const next = placed.find((other, at) => at > index && other.lane === lane);
    const room = Math.floor((next ? next.begin - 1 : charactersAcross) - begin);
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
