import type { BandLabel } from './band-types.ts';

export interface WantedLabel {
  readonly x: number;
  readonly strong: string;
  readonly plain: string;
  readonly tone: BandLabel['tone'];
}

/** A label is never shortened below this: with less it says nothing any more. */
const LEAST_CHARACTERS = 9;
/** Labels are shortened only where this many lanes are taken. */
const LANES_IN_FULL = 4;

const shorten = (text: string, room: number): string =>
  text.length <= room ? text : room < 2 ? '' : `${text.slice(0, room - 1).trimEnd()}…`;

const full = (label: WantedLabel): string => `${label.strong} ${label.plain}`.trim();

interface Lane {
  /** Where its last label ends when it is written in full, and when it is shortened to the least, in characters. */
  fullEnd: number;
  leastEnd: number;
}

/** The lowest lane with room for all that stands there, or a new one; on a crowded day one where labels can be shortened. */
function laneFrom(lanes: readonly Lane[], begin: number): number {
  const inFull = lanes.findIndex((lane) => lane.fullEnd <= begin);
  if (inFull >= 0 || lanes.length < LANES_IN_FULL) return inFull < 0 ? lanes.length : inFull;
  const shortened = lanes.findIndex((lane) => lane.leastEnd <= begin);
  return shortened < 0 ? lanes.length : shortened;
}

/**
 * Puts labels of one row into lanes so that none meets another: each starts at its x, or further left where it would run
 * over the right edge. A label is shortened only where the usual lanes are taken, and where even that is not enough there
 * are more lanes, so that no label is lost whatever the days.
 *
 * @param charactersAcross characters that fit the whole width
 * @returns the labels from left to right by their x
 */
export function placeLabels(wanted: readonly WantedLabel[], charactersAcross: number): BandLabel[] {
  const lanes: Lane[] = [];
  // By where they begin and not by x: a long label near the right edge begins before shorter ones that stand left of it.
  const placed = wanted
    .map((label) => {
      const { length } = full(label);
      return { label, length, begin: Math.min(label.x * charactersAcross, Math.max(0, charactersAcross - length)) };
    })
    .sort((one, other) => one.begin - other.begin || one.label.x - other.label.x)
    .map((one) => {
      const lane = laneFrom(lanes, one.begin);
      lanes[lane] = {
        fullEnd: one.begin + one.length + 1,
        leastEnd: one.begin + Math.min(one.length, LEAST_CHARACTERS) + 1,
      };
      return { ...one, lane };
    });
  const labels = placed.map(({ label, begin, lane }, index) => {
    const next = placed.find((other, at) => at > index && other.lane === lane);
    // A hair's breadth more, so that a difference of fractions does not cost a letter.
    const room = Math.floor((next ? next.begin - 1 : charactersAcross) - begin + 1e-9);
    const strong = shorten(label.strong, room);
    return {
      wantedX: label.x,
      x: begin / charactersAcross,
      lane,
      strong,
      plain: shorten(label.plain, room - strong.length - 1),
      tone: label.tone,
      full: full(label),
    };
  });
  return labels.sort((one, other) => one.wantedX - other.wantedX).map(({ wantedX: _wantedX, ...label }) => label);
}
