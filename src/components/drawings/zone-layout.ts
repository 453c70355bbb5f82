import { nice, ticks } from 'd3-array';
import { firstFree } from './boxes.ts';
import type { Box } from './boxes.ts';
import { PX_PER_MM, standardRatio } from './drawing-scale.ts';
import { countOfReadings, worstPairInWords, worstPairOf } from './fit-side.ts';
import type { FitSide } from './fit-side.ts';
import { textWidthPx } from './text-width.ts';
import type { TextFace } from './text-width.ts';

export const ZONE_TEXT_PX = 13;
const LINE_PX = 17;
const AXIS_PX = 54;
const TOP_PX = 34;
/** About so many lines of the scale. */
const TICKS = 4;
const MAX_PLOT_PX = 250;

export interface PlacedText {
  text: string;
  /** Middle of the text, and its baseline. */
  x: number;
  y: number;
  box: Box;
}

export interface ZoneLayout {
  heightPx: number;
  plot: Box;
  zeroY: number;
  /** Enlargement up and down, of the series 1-2-5. */
  ratio: number;
  ticks: { valueUm: number; y: number }[];
  holeZone: Box | null;
  shaftZone: Box | null;
  holePoints: { x: number; y: number }[];
  shaftPoints: { x: number; y: number }[];
  worst: Box | null;
  labels: Record<'holeZone' | 'shaftZone' | 'zero' | 'worst' | 'holeReadings' | 'shaftReadings', PlacedText | null>;
}

/** Places zones, points and words for a width in pixels. Pure, so that "labels never overlap" can be tested. */
export function layoutZones(widthPx: number, zeroLine: string, hole: FitSide, shaft: FitSide): ZoneLayout {
  const plotX = AXIS_PX;
  const plotWidth = Math.max(120, widthPx - AXIS_PX - 8);
  const { ticksUm, lowUm, highUm, ratio, pxPerUm } = verticalScale([hole, shaft]);
  const plot: Box = { x: plotX, y: TOP_PX, width: plotWidth, height: (highUm - lowUm) * pxPerUm };
  const yOf = (valueUm: number) => plot.y + (highUm - valueUm) * pxPerUm;
  const zeroY = yOf(0);

  const across = (from: number, to: number) => ({ x: plot.x + from * plotWidth, width: (to - from) * plotWidth });
  const zoneBox = (side: FitSide, from: number, to: number): Box | null =>
    side.agreed && {
      ...across(from, to),
      y: yOf(side.agreed.upperUm),
      height: Math.max(2, (side.agreed.upperUm - side.agreed.lowerUm) * pxPerUm),
    };
  const holeZone = zoneBox(hole, 0.03, 0.23);
  const shaftZone = zoneBox(shaft, 0.26, 0.46);
  const points = (side: FitSide, from: number, to: number) => {
    const { x, width } = across(from, to);
    return side.readingsUm.map((valueUm, at) => ({
      x: x + ((at + 0.5) * width) / side.readingsUm.length,
      y: yOf(valueUm),
    }));
  };
  const holePoints = points(hole, 0.56, 0.76);
  const shaftPoints = points(shaft, 0.78, 0.98);
  const pair = worstPairOf(hole, shaft);
  const worst: Box | null = pair && {
    ...across(0.55, 0.99),
    y: Math.min(yOf(pair.holeMinUm), yOf(pair.shaftMaxUm)),
    height: Math.max(2, Math.abs(pair.clearanceUm) * pxPerUm),
  };

  const taken: Box[] = [
    holeZone,
    shaftZone,
    worst,
    { x: plot.x, y: zeroY - 3, width: plotWidth, height: 6 },
    ...[...holePoints, ...shaftPoints].map(({ x, y }) => ({ x: x - 6, y: y - 6, width: 12, height: 12 })),
  ].filter((box) => box !== null);
  const bottomY = plot.y + plot.height;
  // Six labels at most, so that one of six rows below the plot is always free.
  const footRows = [0, 1, 2, 3, 4, 5].map((row) => bottomY + 6 + row * LINE_PX);
  const place = (text: string, centreX: number, topsY: readonly number[], face: TextFace = 'plain') => {
    const width = textWidthPx(text, ZONE_TEXT_PX, face);
    const x = Math.min(Math.max(centreX - width / 2, plot.x), Math.max(plot.x, plot.x + plotWidth - width));
    const boxes = [...topsY, ...footRows].map((y) => ({ x, y, width, height: LINE_PX })) as [Box, ...Box[]];
    const box = firstFree(boxes, taken);
    taken.push(box);
    return { text, x: box.x + width / 2, y: box.y + LINE_PX - 4, box };
  };
  const nearZone = (zone: Box | null, side: FitSide, preferAbove: boolean): PlacedText | null => {
    if (!zone || !side.agreed) return null;
    const above = zone.y - LINE_PX - 2;
    const below = zone.y + zone.height + 3;
    return place(
      `${side.name}${widthPx < 480 ? '' : ' agreed'} ${side.agreed.label}`,
      zone.x + zone.width / 2,
      preferAbove ? [above, below] : [below, above],
    );
  };

  const worstLabel =
    pair && worst
      ? place(
          `worst${widthPx < 340 ? '' : ' pair'}: ${worstPairInWords(pair)}`,
          worst.x + worst.width / 2,
          worstTops(worst, plot),
          'bold',
        )
      : null;
  const holeLabel = nearZone(holeZone, hole, true);
  const shaftLabel = nearZone(shaftZone, shaft, false);
  const foot = (side: FitSide, from: number, to: number): PlacedText => {
    const { x, width } = across(from, to);
    return place(`${side.name}, ${countOfReadings(side.readingsUm.length)}`, x + width / 2, []);
  };
  const holeReadings = foot(hole, 0.55, 0.77);
  const shaftReadings = foot(shaft, 0.77, 0.99);
  const zero = place(`zero line ${zeroLine}`, plot.x + plotWidth * 0.24, [zeroY + 5, zeroY - LINE_PX - 3]);

  const texts = [worstLabel, holeLabel, shaftLabel, holeReadings, shaftReadings, zero].filter((text) => text !== null);

  return {
    heightPx: Math.max(...texts.map(({ box }) => box.y + box.height), bottomY) + 4,
    plot,
    zeroY,
    ratio,
    ticks: ticksUm.map((valueUm) => ({ valueUm, y: yOf(valueUm) })),
    holeZone,
    shaftZone,
    holePoints,
    shaftPoints,
    worst,
    labels: { holeZone: holeLabel, shaftZone: shaftLabel, zero, worst: worstLabel, holeReadings, shaftReadings },
  };
}

/** Above the hatched region, below it, else in the row kept free above the plot. */
const worstTops = (worst: Box, plot: Box): number[] => [
  worst.y - LINE_PX - 4,
  worst.y + worst.height + 4,
  plot.y - LINE_PX - 8,
];

function verticalScale(sides: readonly FitSide[]) {
  const valuesUm = sides.flatMap(({ agreed, readingsUm }) => [
    ...(agreed ? [agreed.lowerUm, agreed.upperUm] : []),
    ...readingsUm,
  ]);
  const furthestUm = Math.max(10, ...valuesUm.map(Math.abs));
  const [lowUm, highUm] = nice(
    Math.min(-furthestUm * 0.3, ...valuesUm) * 1.08,
    Math.max(furthestUm * 0.3, ...valuesUm) * 1.08,
    TICKS,
  );
  const ratio = standardRatio((MAX_PLOT_PX / (highUm - lowUm) / PX_PER_MM) * 1000);
  return { ticksUm: ticks(lowUm, highUm, TICKS), lowUm, highUm, ratio, pxPerUm: (ratio * PX_PER_MM) / 1000 };
}
