import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EngineInputError } from '../../../shared/engines/engine-input-error.ts';
import { assessClearance, resolutionUncertaintyUm } from '../../../shared/engines/fit/clearance.ts';
import { HAND_FITS } from '../../../shared/engines/fit/hand-fits.ts';
import { STANDARD_TOLERANCES_UM, SIZE_STEPS_MM } from '../../../shared/engines/fit/iso-tables.ts';
import { fitOf, limitsFor, standardToleranceUm } from '../../../shared/engines/fit/limits.ts';
import { removalFor } from '../../../shared/engines/fit/removal.ts';
import { MM_PER_INCH } from '../../../shared/units/length.ts';

// ISO 286-1 values as printed in open machine-drawing texts (table 15.1 and 15.2 of one, two sources agreeing): IT5 to IT11.
const PUBLISHED_IT: [number, number[]][] = [
  [12, [8, 11, 18, 27, 43, 70, 110]],
  [25, [9, 13, 21, 33, 52, 84, 130]],
  [40, [11, 16, 25, 39, 62, 100, 160]],
  // From memory of the standard's table 1, cross-checked by the formula below.
  [8, [6, 9, 15, 22, 36, 58, 90]],
  [65, [13, 19, 30, 46, 74, 120, 190]],
  [150, [18, 25, 40, 63, 100, 160, 250]],
];

describe('standard tolerances (ISO 286-1, table 1)', () => {
  it.each(PUBLISHED_IT)('at %s mm are the published ones', (nominalMm, values) => {
    expect(values.map((_value, index) => standardToleranceUm(nominalMm, 5 + index))).toEqual(values);
  });

  it("agree with i = 0.45 ∛D + 0.001 D times the grade multipliers, within the standard's rounding", () => {
    const multipliers = [7, 10, 16, 25, 40, 64, 100, 160, 250];
    SIZE_STEPS_MM.forEach((upToMm, step) => {
      const overMm = step === 0 ? 1 : (SIZE_STEPS_MM[step - 1] ?? 0);
      const meanMm = Math.sqrt(overMm * upToMm);
      const iUm = 0.45 * Math.cbrt(meanMm) + 0.001 * meanMm;
      multipliers.forEach((multiplier, grade) => {
        const tabled = STANDARD_TOLERANCES_UM[step]?.[grade] ?? NaN;
        // The smallest step is rounded further up by the standard than the others.
        expect(Math.abs(tabled - multiplier * iUm) / tabled, `IT${5 + grade} up to ${upToMm} mm`).toBeLessThan(
          step === 0 ? 0.2 : 0.1,
        );
      });
    });
  });

  it('a boundary size belongs to the lower step', () => {
    expect([standardToleranceUm(30, 7), standardToleranceUm(30.001, 7)]).toEqual([21, 25]);
  });

  it('refuse sizes and grades outside the tables, naming the field', () => {
    for (const [size, grade, field] of [
      [0, 7, 'nominalMm'],
      [181, 7, 'nominalMm'],
      [25, 15, 'grade'],
      [NaN, 7, 'nominalMm'],
    ] as const)
      expect(() => standardToleranceUm(size, grade)).toThrow(expect.objectContaining({ field }) as EngineInputError);
  });
});

describe('classic fits', () => {
  // Published examples at 25 mm and 40 mm (computed from the standard's tables): least and greatest clearance, um.
  it.each([
    ['H7', 'g6', 25, 7, 41, 'clearance'],
    ['H7', 'h6', 25, 0, 34, 'clearance'],
    ['H8', 'f7', 25, 20, 74, 'clearance'],
    ['H7', 'k6', 25, -15, 19, 'transition'],
    ['H7', 'p6', 25, -35, -1, 'interference'],
    ['H9', 'd9', 25, 65, 169, 'clearance'],
    ['H7', 'g6', 40, 9, 50, 'clearance'],
    ['H7', 'p6', 40, -42, -1, 'interference'],
  ] as const)('%s/%s at %s mm', (hole, shaft, nominalMm, min, max, kind) => {
    expect(fitOf(hole, shaft, nominalMm)).toMatchObject({ minClearanceUm: min, maxClearanceUm: max, kind });
  });

  // Hole delta rules: K7 +6/-15, N9 0/-52, P7 -14/-35 at 25 mm (ISO 286-2, from memory).
  it.each([
    ['K7', 6, -15],
    ['N9', 0, -52],
    ['P7', -14, -35],
    ['JS7', 10.5, -10.5],
  ] as const)('%s at 25 mm', (holeClass, upperUm, lowerUm) => {
    expect(limitsFor(holeClass, 25)).toEqual({ upperUm, lowerUm });
  });

  it('refuse what is no class', () => {
    for (const wrong of ['H', '7', 'Hh7', 'Z7', 'q6', '']) expect(() => limitsFor(wrong, 25)).toThrow(EngineInputError);
  });
});

const reading = (valueMm: number, resolutionUm = 10) => ({ valueMm, resolutionUm });

describe('clearance and what comes off', () => {
  // The worked example of the trade's brief: worst pair 9 - 52 = -43 um, agreed 50 to 100, middle 75, so 118 off, 59 a side.
  it('follows the worked example', () => {
    const range = { clearanceMinUm: 50, clearanceMaxUm: 100 };
    const result = assessClearance({
      hole: [32.031, 32.009, 32.018].map((mm) => reading(mm)),
      shaft: [32.022, 32.052, 32.044].map((mm) => reading(mm)),
      ...range,
    });
    expect(result.worstPairUm).toBeCloseTo(-43, 6);
    expect(result.verdict).toBe('does-not-conform');
    const removal = removalFor(result, range);
    expect(removal.onDiameterUm).toBeCloseTo(118, 6);
    expect(removal.perSideUm).toBeCloseTo(59, 6);
    expect(removal.thenWorstPairUm).toBeCloseTo(75, 6);
  });

  // JCGM 100:2008, F.2.2.1: a resolution d gives d / (2 sqrt 3); two combine by root of squares, k = 2.
  it("takes the gauge's doubt from its resolution", () => {
    expect(resolutionUncertaintyUm(10)).toBeCloseTo(10 / Math.sqrt(12), 12);
    const { doubtUm } = assessClearance({
      hole: [reading(30.1)],
      shaft: [reading(30)],
      clearanceMinUm: 0,
      clearanceMaxUm: 200,
    });
    expect(doubtUm).toBeCloseTo(2 * Math.hypot(10 / Math.sqrt(12), 10 / Math.sqrt(12)), 12);
  });

  // ISO 14253-1: proven only inside the limits reduced by the doubt, disproven only outside those widened by it.
  it('decides on neither side of the guard bands', () => {
    const verdictAt = (clearanceUm: number): string =>
      assessClearance({
        hole: [reading(30 + clearanceUm / 1000)],
        shaft: [reading(30)],
        clearanceMinUm: 50,
        clearanceMaxUm: 100,
      }).verdict;
    const doubtUm = 2 * Math.hypot(10 / Math.sqrt(12), 10 / Math.sqrt(12));
    expect(verdictAt(50 - doubtUm - 0.1)).toBe('does-not-conform');
    expect(verdictAt(50 - doubtUm + 0.1)).toBe('cannot-be-decided');
    expect(verdictAt(50 + doubtUm - 0.1)).toBe('cannot-be-decided');
    expect(verdictAt(50 + doubtUm + 0.1)).toBe('conforms');
    expect(verdictAt(100 - doubtUm - 0.1)).toBe('conforms');
    expect(verdictAt(100 - doubtUm + 0.1)).toBe('cannot-be-decided');
    expect(verdictAt(100 + doubtUm - 0.1)).toBe('cannot-be-decided');
    expect(verdictAt(100 + doubtUm + 0.1)).toBe('does-not-conform');
  });

  it('names the side that has no readings, and the range that is out of order', () => {
    const attempt = (input: object) => () =>
      assessClearance({ hole: [reading(30)], shaft: [reading(29.9)], clearanceMinUm: 0, clearanceMaxUm: 10, ...input });
    expect(attempt({ hole: [] })).toThrow(expect.objectContaining({ field: 'hole' }) as Error);
    expect(attempt({ shaft: [reading(-1)] })).toThrow(expect.objectContaining({ field: 'shaft' }) as Error);
    expect(attempt({ clearanceMinUm: 20 })).toThrow(expect.objectContaining({ field: 'clearanceMinUm' }) as Error);
  });

  const diameters = fc.array(fc.double({ min: 29.5, max: 30.5, noNaN: true }), { minLength: 1, maxLength: 12 });

  it('adding material to the shaft never loosens, and a removal brings the worst pair to the middle', () => {
    fc.assert(
      fc.property(diameters, diameters, fc.double({ min: 0, max: 0.2, noNaN: true }), (holes, shafts, addedMm) => {
        const range = { clearanceMinUm: 50, clearanceMaxUm: 100 };
        const at = (mm: number) =>
          assessClearance({
            hole: holes.map((one) => reading(one)),
            shaft: shafts.map((one) => reading(one + mm)),
            ...range,
          });
        expect(at(addedMm).worstPairUm).toBeLessThanOrEqual(at(0).worstPairUm + 1e-9);
        const removal = removalFor(at(0), range);
        if (removal.onDiameterUm > 0) expect(removal.thenWorstPairUm).toBeCloseTo(75, 6);
        expect(removal.onDiameterUm).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it('the least and the most that may come off leave the worst pair at the ends of the agreed range', () => {
    fc.assert(
      fc.property(diameters, diameters, (holes, shafts) => {
        const range = { clearanceMinUm: 50, clearanceMaxUm: 100 };
        const at = (removedUm: number) =>
          assessClearance({
            hole: holes.map((one) => reading(one)),
            shaft: shafts.map((one) => reading(one - removedUm / 1000)),
            ...range,
          });
        const { leastOnDiameterUm, mostOnDiameterUm, onDiameterUm } = removalFor(at(0), range);
        if (at(0).worstPairUm > range.clearanceMaxUm) {
          // Too loose already: nothing that comes off helps.
          expect([leastOnDiameterUm, onDiameterUm, mostOnDiameterUm]).toEqual([0, 0, 0]);
          return;
        }
        expect(at(mostOnDiameterUm).worstPairUm).toBeCloseTo(range.clearanceMaxUm, 6);
        if (leastOnDiameterUm > 0) expect(at(leastOnDiameterUm).worstPairUm).toBeCloseTo(range.clearanceMinUm, 6);
        else expect(at(0).worstPairUm).toBeGreaterThanOrEqual(range.clearanceMinUm);
        expect(onDiameterUm).toBeGreaterThanOrEqual(leastOnDiameterUm);
        expect(onDiameterUm).toBeLessThanOrEqual(mostOnDiameterUm);
      }),
    );
  });

  it('says when the parts are further from round than the agreed range is wide', () => {
    const range = { clearanceMinUm: 50, clearanceMaxUm: 100 };
    const withSpread = (spreadMm: number) =>
      removalFor(
        assessClearance({ hole: [reading(32), reading(32 + spreadMm)], shaft: [reading(32.05)], ...range }),
        range,
      );
    expect([withSpread(0.049).spreadTooWide, withSpread(0.051).spreadTooWide]).toEqual([false, true]);
    // Worst pair at the middle, 75; the loosest is the spread further.
    expect(withSpread(0.06).thenLoosestPairUm).toBeCloseTo(135, 6);
  });

  it('the coarsest gauge of a set speaks for it', () => {
    const { hole } = assessClearance({
      hole: [reading(30, 1), reading(30, 20)],
      shaft: [reading(29.9)],
      clearanceMinUm: 0,
      clearanceMaxUm: 200,
    });
    expect(hole).toMatchObject({ count: 2, resolutionUm: 20, spreadUm: 0 });
  });

  // Common practice of the trade; 50 to 100 um is the range of the brief's own drawing.
  it('hand fits are in order from loose to tight, and a hand slip is 50 to 100 um', () => {
    expect(HAND_FITS.find((fit) => fit.name === 'hand slip')).toMatchObject({
      clearanceMinUm: 50,
      clearanceMaxUm: 100,
    });
    const middles = HAND_FITS.map((fit) => fit.clearanceMinUm + fit.clearanceMaxUm);
    expect(middles).toEqual([...middles].sort((one, other) => other - one));
    for (const fit of HAND_FITS) expect(fit.clearanceMinUm).toBeLessThan(fit.clearanceMaxUm);
  });

  it('a change of unit on the way changes no verdict', () => {
    fc.assert(
      fc.property(diameters, diameters, (holes, shafts) => {
        const verdict = (through: (mm: number) => number) =>
          assessClearance({
            hole: holes.map((one) => reading(through(one))),
            shaft: shafts.map((one) => reading(through(one))),
            clearanceMinUm: 50,
            clearanceMaxUm: 100,
          });
        const [direct, viaInch] = [verdict((mm) => mm), verdict((mm) => (mm / MM_PER_INCH) * MM_PER_INCH)];
        expect(viaInch.worstPairUm).toBeCloseTo(direct.worstPairUm, 6);
        const onAnEdge = [50, 100].some(
          (edge) => Math.abs(Math.abs(direct.worstPairUm - edge) - direct.doubtUm) < 1e-6,
        );
        if (!onAnEdge) expect(viaInch.verdict).toBe(direct.verdict);
      }),
    );
  });
});
