import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { overlaps } from '../../../src/components/drawings/boxes.ts';
import { ratioInWords, standardRatio } from '../../../src/components/drawings/drawing-scale.ts';
import { fitInWords, worstPairOf } from '../../../src/components/drawings/fit-side.ts';
import type { FitSide } from '../../../src/components/drawings/fit-side.ts';
import { layoutZones } from '../../../src/components/drawings/zone-layout.ts';

/** The example of the product's own picture: worst pair 9 − 52 = −43 µm. */
const bore: FitSide = {
  name: 'bore',
  agreed: { label: 'H8', lowerUm: 0, upperUm: 39 },
  readingsUm: [31, 18, 12, 26, 9, 15],
};
const spigot: FitSide = {
  name: 'spigot',
  agreed: { label: 'f7', lowerUm: -50, upperUm: -25 },
  readingsUm: [22, 31, 44, 38, 52, 47],
};

const readings = fc.array(fc.integer({ min: -400, max: 400 }), { maxLength: 12 });
const agreed = (label: string) =>
  fc.option(
    fc
      .tuple(fc.integer({ min: -300, max: 300 }), fc.integer({ min: 4, max: 120 }))
      .map(([lowerUm, widthUm]) => ({ label, lowerUm, upperUm: lowerUm + widthUm })),
  );
const side = (name: string, label: string) =>
  fc.record({ name: fc.constant(name), agreed: agreed(label), readingsUm: readings });

describe('zone drawing', () => {
  it('takes the worst pair from the smallest hole and the largest shaft', () => {
    expect(worstPairOf(bore, spigot)).toEqual({ holeMinUm: 9, shaftMaxUm: 52, clearanceUm: -43 });
    expect(worstPairOf({ ...bore, readingsUm: [] }, spigot)).toBeNull();
  });

  it('says the same in words', () => {
    expect(fitInWords('32.000 mm', bore, spigot)).toBe(
      'Deviations from 32.000 mm. Bore agreed H8: 0 to +39 µm. Bore, 6 readings: +9 to +31 µm. ' +
        'Spigot agreed f7: −50 to −25 µm. Spigot, 6 readings: +22 to +52 µm. Worst pair: 43 µm interference.',
    );
  });

  it('draws zones and points at the stated enlargement', () => {
    const layout = layoutZones(640, '32.000 mm', bore, spigot);
    const pxPerUm = (layout.ratio * 96) / 25.4 / 1000;
    expect(layout.holeZone?.height).toBeCloseTo(39 * pxPerUm, 6);
    expect(layout.zeroY - (layout.holePoints[0]?.y ?? 0)).toBeCloseTo(31 * pxPerUm, 6);
    expect(layout.worst?.height).toBeCloseTo(43 * pxPerUm, 6);
  });

  it('puts the hole zone on the zero line and the shaft zone below it, as ISO 286-1 draws H and f', () => {
    const layout = layoutZones(640, '32.000 mm', bore, spigot);
    expect((layout.holeZone?.y ?? 0) + (layout.holeZone?.height ?? 0)).toBeCloseTo(layout.zeroY, 6);
    expect(layout.shaftZone?.y).toBeGreaterThan(layout.zeroY);
  });

  it('never lets two labels meet, whatever is read and however narrow the page', () => {
    fc.assert(
      fc.property(
        side('bore', 'H8'),
        side('spigot', 'f7'),
        fc.integer({ min: 280, max: 1200 }),
        (hole, shaft, width) => {
          const { labels } = layoutZones(width, '32.000 mm', hole, shaft);
          const boxes = Object.values(labels)
            .filter((label) => label !== null)
            .map((label) => label.box);
          for (const [at, box] of boxes.entries())
            for (const other of boxes.slice(at + 1)) expect(overlaps(box, other)).toBe(false);
        },
      ),
      { numRuns: 400 },
    );
  });

  it('keeps every zone and reading inside the plot', () => {
    fc.assert(
      fc.property(side('bore', 'H8'), side('spigot', 'f7'), (hole, shaft) => {
        const { plot, holePoints, shaftPoints, holeZone, shaftZone } = layoutZones(500, '32.000 mm', hole, shaft);
        const edges = [holeZone, shaftZone].flatMap((zone) => (zone ? [zone.y, zone.y + zone.height] : []));
        for (const y of [...edges, ...holePoints.map((p) => p.y), ...shaftPoints.map((p) => p.y)]) {
          expect(y).toBeGreaterThanOrEqual(plot.y - 1e-6);
          expect(y).toBeLessThanOrEqual(plot.y + plot.height + 2);
        }
      }),
    );
  });
});

describe('scales', () => {
  it.each([
    [7.3, 5, '5:1'],
    [2, 2, '2:1'],
    [1.99, 1, '1:1'],
    [0.6, 0.5, '1:2'],
    [340, 200, '200:1'],
  ])('%f comes down to %f, said %s (series 1-2-5, ISO 5455)', (atMost, ratio, words) => {
    expect(standardRatio(atMost)).toBeCloseTo(ratio, 9);
    expect(ratioInWords(standardRatio(atMost))).toBe(words);
  });
});
