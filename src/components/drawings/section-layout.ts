import { PX_PER_MM, standardRatio } from './drawing-scale.ts';

export interface SectionInput {
  /** Smallest hole and largest shaft that were read, or the agreed limits. */
  holeDiameterMm: number;
  shaftDiameterMm: number;
  /** Length on which the two touch, from the spigot's free end to its shoulder. */
  engagementMm: number;
  /** Wall of the outer part; null while nobody measured it. */
  wallMm: number | null;
  removal: SectionRemoval | null;
}

export interface SectionRemoval {
  from: 'hole' | 'shaft';
  /** Material off the diameter; half of it comes off each side. */
  onDiameterMm: number;
  /** From the free end (or the mouth); the rest keeps what shows when closed. */
  overLengthMm: number;
}

/** All in pixels from the drawing's left and top edge; y of the upper half, the lower one is its mirror about `axisY`. */
export interface SectionLayout {
  heightPx: number;
  /** Drawing : part, along the axis and across it. */
  ratio: number;
  /** How many times larger clearance and removal are drawn than the rest; 1 when they show by themselves. */
  exaggeration: number;
  axisY: number;
  /** Left end of the sleeve, spigot's free end, mouth of the bore (shoulder), end of the drawn shoulder. */
  sleeveX: number;
  freeEndX: number;
  shoulderX: number;
  endX: number;
  /** Half heights above the axis. */
  outerR: number;
  holeR: number;
  shaftR: number;
  /** Depth and reach of what comes off, drawn with the exaggeration. */
  removal: { from: 'hole' | 'shaft'; depth: number; fromX: number; toX: number } | null;
}

const TOP_PX = 46;
const BOTTOM_PX = 64;
const SIDE_PX = 84;
const MAX_HALF_PX = 165;
/** A wall that was not measured is drawn as an example, and the drawing says so. */
const EXAMPLE_WALL_SHARE = 0.12;
/** A gap below this many pixels can't be told from a line. */
const WANTED_GAP_PX = 9;

/** Places the section for a width in pixels. */
export function layoutSection(widthPx: number, input: SectionInput): SectionLayout {
  const { holeDiameterMm, shaftDiameterMm, engagementMm, wallMm, removal } = input;
  const behindMm = Math.max(3, engagementMm * 0.25);
  const shoulderMm = Math.max(6, engagementMm * 0.5);
  const lengthMm = behindMm + engagementMm + shoulderMm;
  const outerRMm = holeDiameterMm / 2 + (wallMm ?? holeDiameterMm * EXAMPLE_WALL_SHARE);
  const ratio = standardRatio(
    Math.min((widthPx - 2 * SIDE_PX) / lengthMm, MAX_HALF_PX / outerRMm, PX_PER_MM * 10) / PX_PER_MM,
  );
  const px = (mm: number) => mm * ratio * PX_PER_MM;

  const gapMm = (holeDiameterMm - shaftDiameterMm) / 2;
  const smallestMm = Math.max(Math.abs(gapMm), (removal?.onDiameterMm ?? 0) / 2);
  const exaggeration =
    smallestMm === 0 || px(smallestMm) >= WANTED_GAP_PX ? 1 : standardRatio((WANTED_GAP_PX / px(smallestMm)) * 1.2);

  const sleeveX = Math.round((widthPx - px(lengthMm)) / 2);
  const freeEndX = sleeveX + px(behindMm);
  const shoulderX = freeEndX + px(engagementMm);
  const axisY = TOP_PX + px(outerRMm);
  const holeR = px(holeDiameterMm / 2);
  return {
    heightPx: axisY + px(outerRMm) + BOTTOM_PX,
    ratio,
    exaggeration,
    axisY,
    sleeveX,
    freeEndX,
    shoulderX,
    endX: shoulderX + px(shoulderMm),
    outerR: px(outerRMm),
    holeR,
    shaftR: holeR - px(gapMm) * exaggeration,
    removal: removal && {
      from: removal.from,
      depth: Math.max(2, px(removal.onDiameterMm / 2) * exaggeration),
      fromX: removal.from === 'shaft' ? freeEndX : shoulderX - px(removal.overLengthMm),
      toX: removal.from === 'shaft' ? freeEndX + px(removal.overLengthMm) : shoulderX,
    },
  };
}
