import { describe, expect, it } from 'vitest';
import { layoutSection } from '../../../src/components/drawings/section-layout.ts';

const joint = { holeDiameterMm: 32.009, shaftDiameterMm: 32.052, engagementMm: 16, wallMm: 3 };
const removal = { from: 'shaft' as const, onDiameterMm: 0.118, overLengthMm: 14.5 };

describe('section through a joint', () => {
  it('draws lengths and diameters at one and the same stated scale', () => {
    const layout = layoutSection(560, { ...joint, removal });
    const pxPerMm = (layout.ratio * 96) / 25.4;
    expect(layout.shoulderX - layout.freeEndX).toBeCloseTo(16 * pxPerMm, 6);
    expect(layout.holeR).toBeCloseTo(16.0045 * pxPerMm, 6);
    expect(layout.outerR - layout.holeR).toBeCloseTo(3 * pxPerMm, 6);
  });

  it('enlarges interference and removal by one stated factor: 43 and 118 µm keep their proportion', () => {
    const layout = layoutSection(560, { ...joint, removal });
    const pxPerMm = (layout.ratio * 96) / 25.4;
    expect(layout.exaggeration).toBeGreaterThan(1);
    expect(layout.shaftR - layout.holeR).toBeCloseTo(0.0215 * pxPerMm * layout.exaggeration, 6);
    expect((layout.removal?.depth ?? 0) / (layout.shaftR - layout.holeR)).toBeCloseTo(118 / 43, 6);
  });

  it('stops the cut short of the shoulder, where it would show', () => {
    const layout = layoutSection(560, { ...joint, removal });
    expect(layout.removal?.fromX).toBe(layout.freeEndX);
    expect(layout.removal?.toX).toBeLessThan(layout.shoulderX);
  });

  it('says 1 when the clearance shows by itself', () => {
    expect(layoutSection(560, { ...joint, shaftDiameterMm: 24, removal: null }).exaggeration).toBe(1);
  });

  it.each([320, 360, 560, 1200])('stays inside %i px', (widthPx) => {
    const layout = layoutSection(widthPx, { ...joint, removal });
    expect(layout.sleeveX).toBeGreaterThanOrEqual(40);
    expect(layout.endX).toBeLessThanOrEqual(widthPx - 40);
  });
});
