import { describe, expect, it } from 'vitest';
import { bandModel } from '../../../shared/engines/band/band-model.ts';
import type { BandInput, BandLeg } from '../../../shared/engines/band/band-types.ts';
import {
  BAND_TEXT_PX,
  bandGeometry,
  charactersAcross,
  gutterFor,
  LANE_PX,
} from '../../../src/components/drawings/band-geometry.ts';
import { lanesOf } from '../../../src/components/drawings/band-lanes.ts';
import { overlaps } from '../../../src/components/drawings/boxes.ts';
import { textWidthPx } from '../../../src/components/drawings/text-width.ts';

const leg = (id: string, partId: string, startDay: string, endDay: string, more: Partial<BandLeg> = {}): BandLeg => ({
  id,
  partId,
  shopName: `Shop of leg ${id}`,
  work: 'finishing',
  state: 'planned',
  startDay,
  endDay,
  held: null,
  afterLegIds: [],
  ...more,
});

const input: BandInput = {
  todayIso: '2026-03-10',
  deliveredOn: null,
  expected: { fromDay: '2026-04-13', toDay: '2026-04-20' },
  parts: [
    { id: 'hilt', name: 'Hilt' },
    { id: 'chassis', name: 'Chassis' },
  ],
  legs: [
    leg('1', 'hilt', '2026-03-02', '2026-03-03', { state: 'finished' }),
    leg('2', 'hilt', '2026-03-04', '2026-03-05', { state: 'finished' }),
    leg('3', 'hilt', '2026-03-06', '2026-03-30', {
      state: 'under-way',
      held: { sinceDay: '2026-03-09', words: 'pommel will not draw' },
      afterLegIds: ['2', '4'],
    }),
    leg('4', 'chassis', '2026-03-01', '2026-03-05', { state: 'finished' }),
  ],
  handoffs: [
    {
      id: 'h',
      partIds: ['hilt'],
      fromName: 'One',
      toName: 'Two',
      fromLegId: '1',
      toLegId: '2',
      day: '2026-03-04',
      state: 'agreed',
    },
  ],
};

describe('relay band across', () => {
  it.each([720, 900, 1320])('keeps its labels apart in pixels at %i px, days crowded as they are', (widthPx) => {
    const gutterPx = gutterFor(input.parts.map((part) => part.name));
    const model = bandModel(input, charactersAcross(widthPx, gutterPx));
    const geometry = bandGeometry(model, widthPx, gutterPx);
    const boxes = model.rows.flatMap((row, at) =>
      row.labels.map((label) => ({
        x: geometry.xOf(label.x),
        y: (geometry.rows[at]?.labelFootY ?? 0) - label.lane * LANE_PX - BAND_TEXT_PX,
        width: textWidthPx(`${label.strong} ${label.plain}`.trim(), BAND_TEXT_PX, 'bold'),
        height: BAND_TEXT_PX,
      })),
    );
    expect(boxes).toHaveLength(6);
    for (const [at, box] of boxes.entries())
      for (const other of boxes.slice(at + 1)) expect(overlaps(box, other)).toBe(false);
  });

  it('keeps rows, their labels and the dates below them in their own strips', () => {
    const model = bandModel(input, 100);
    const { rows, ticksY, heightPx } = bandGeometry(model, 900, 90);
    const [hilt, chassis] = rows;
    expect(hilt && hilt.labelFootY - (model.rows[0]?.lanes ?? 0) * LANE_PX).toBeGreaterThanOrEqual(30);
    expect(chassis && hilt && chassis.labelFootY - (model.rows[1]?.lanes ?? 0) * LANE_PX).toBeGreaterThan(
      (hilt?.axisY ?? 0) + (hilt?.halfPx ?? 0) + 7,
    );
    expect(ticksY).toBeGreaterThan((chassis?.axisY ?? 0) + (chassis?.halfPx ?? 0));
    expect(heightPx).toBeGreaterThan(ticksY + 18);
  });
});

describe('relay band downwards', () => {
  const steps = lanesOf(bandModel(input, 100));

  it('has one step per leg and handoff and the delivery, in the order of the list', () => {
    expect(steps.map(({ step }) => step.id)).toEqual(['4', '1', 'h', '2', '3', 'delivery']);
  });

  it('gives each part its lane: a tube in its own, a rod or nothing in the other', () => {
    const [chassisStep, , ring, , held] = steps;
    expect(chassisStep?.cells.map((cell) => cell.kind)).toEqual(['none', 'tube']);
    expect(ring?.cells[0]).toMatchObject({ kind: 'ring', state: 'agreed', before: true, after: true });
    expect(held?.cells[0]).toMatchObject({ kind: 'tube', held: true, here: true, state: 'under-way' });
  });

  it('leads a part that ends here to the part it goes into', () => {
    expect(steps[0]?.cells[1]).toMatchObject({ kind: 'tube', after: false, joins: 1 });
  });

  it('draws longer work longer', () => {
    expect(steps.map(({ size }) => size)).toEqual(['short', 'short', 'ring', 'short', 'long', 'short']);
  });
});
