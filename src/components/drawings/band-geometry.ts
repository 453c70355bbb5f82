import type { BandModel } from '../../../shared/engines/band/band-types.ts';
import { textWidthPx } from './text-width.ts';

export const BAND_TEXT_PX = 13;
/** Height of one lane of labels. */
export const LANE_PX = 17;
const TOP_PX = 30;
const FOOT_PX = 34;
const RIGHT_PX = 20;
/** Wide capitals with air between, as the part names are set. */
const STAMP_ADVANCE_PX = 10.2;

/** Below this width the band turns downwards. */
export const ACROSS_FROM_PX = 720;

export interface RowGeometry {
  /** Axis of the tube, half of its thickness, and the edge that labels stand on, in pixels. */
  axisY: number;
  halfPx: number;
  labelFootY: number;
}

export interface BandGeometry {
  heightPx: number;
  gutterPx: number;
  /** Pixels of a fraction of time. */
  xOf: (fraction: number) => number;
  rows: RowGeometry[];
  ticksY: number;
}

/** Room for the part names at the left, in pixels, from the longest of them. */
export const gutterFor = (names: readonly string[]): number =>
  Math.min(180, Math.max(64, Math.max(0, ...names.map((name) => name.length)) * STAMP_ADVANCE_PX + 18));

/** Letters of label text that fit beside the gutter; on the safe side by the widest of the two weights. */
export const charactersAcross = (widthPx: number, gutterPx: number): number =>
  Math.max(20, Math.floor((widthPx - gutterPx - RIGHT_PX) / textWidthPx('n', BAND_TEXT_PX, 'bold')));

/** Heights of the rows: the first part is the piece itself and is drawn thicker than what goes into it. */
export function bandGeometry(model: BandModel, widthPx: number, gutterPx: number): BandGeometry {
  let y = TOP_PX;
  const rows = model.rows.map((row, at): RowGeometry => {
    const halfPx = at === 0 ? 13 : 8;
    const labelFootY = y + row.lanes * LANE_PX + 4;
    const axisY = labelFootY + 12 + halfPx;
    y = axisY + halfPx + 14;
    return { axisY, halfPx, labelFootY };
  });
  return {
    heightPx: y + FOOT_PX,
    gutterPx,
    xOf: (fraction) => gutterPx + fraction * (widthPx - gutterPx - RIGHT_PX),
    rows,
    ticksY: y + 6,
  };
}
