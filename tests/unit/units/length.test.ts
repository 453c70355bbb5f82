import fc from 'fast-check';
import { unit } from 'mathjs';
import { describe, expect, it } from 'vitest';
import {
  formatDifference,
  formatLength,
  formatMm,
  formatUm,
  looksLikeUnitMixUp,
  MM_PER_INCH,
  nearestFraction,
  parseLength,
} from '../../../shared/units/length.ts';

const valueOf = (typed: string, hint?: 'mm' | 'inch' | 'inch-fraction'): number | string => {
  const read = parseLength(typed, hint);
  return read.ok ? read.valueMm : read.reason;
};

describe('the inch', () => {
  it('is 25.4 mm exactly (international yard and pound agreement, 1959)', () => expect(MM_PER_INCH).toBe(25.4));

  it('agrees with an independent library of units', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 40, noNaN: true }), (inches) => {
        expect(inches * MM_PER_INCH).toBeCloseTo(unit(inches, 'inch').toNumber('mm'), 9);
      }),
    );
  });
});

describe('typed lengths', () => {
  it.each([
    ['31.957', 31.957],
    ['31,957 mm', 31.957],
    [' 31.957mm ', 31.957],
    ['.5', 0.5],
    ['1.2582 in', 1.2582 * 25.4],
    ['1.2582"', 1.2582 * 25.4],
    ['1 1/4', 31.75],
    ['1-17/64 in', (1 + 17 / 64) * 25.4],
    ['63/64"', (63 / 64) * 25.4],
    ['7/8 inch', 22.225],
  ])('%s is %s mm', (typed, mm) => expect(valueOf(typed)).toBeCloseTo(mm, 9));

  it('takes the unit of a bare number from the hint, and a mark in the text over it', () => {
    expect(valueOf('1.25', 'inch')).toBeCloseTo(31.75, 9);
    expect(valueOf('31.75 mm', 'inch')).toBeCloseTo(31.75, 9);
  });

  it.each([
    ['', 'empty'],
    ['1,234.5', 'ambiguous'],
    ['12 34', 'unreadable'],
    ['a lot', 'unreadable'],
    ['-3', 'not-positive'],
    ['0', 'not-positive'],
    ['1/0', 'zero-denominator'],
    ['9'.repeat(400), 'unreadable'],
    [`${'9'.repeat(400)}/${'9'.repeat(400)}`, 'unreadable'],
    ['1.234,5', 'ambiguous'],
    ['1e3', 'unreadable'],
    ['31.957 cm', 'unreadable'],
    ['3/4 mm', 'unreadable'],
  ])('%j is refused: %s', (typed, reason) => expect(valueOf(typed)).toBe(reason));

  it('points at a unit mixed up', () => {
    expect([looksLikeUnitMixUp(1.26, 32), looksLikeUnitMixUp(32000, 32), looksLikeUnitMixUp(31.9, 32)]).toEqual([
      true,
      true,
      false,
    ]);
  });
});

describe('shown lengths', () => {
  it("say a fraction's error when it is not exact", () => {
    expect(formatLength(22.225, 'inch-fraction')).toBe('7/8 in');
    expect(formatLength(32, 'inch-fraction')).toMatch(/^1 17\/64 in − \d+ µm$/);
  });

  it('carry their digits, and a minus sign only where something is left to be minus', () => {
    expect(formatUm(-43)).toBe('−43 µm');
    expect(formatUm(-0.4)).toBe('0 µm');
    expect(formatMm(-0.043)).toBe('−0.043 mm');
    expect(formatMm(32)).toBe('32.000 mm');
    expect(formatMm(-0.0004)).toBe('0.000 mm');
    expect(formatLength(31.958_28, 'inch')).toBe('1.2582 in');
  });

  it('are read again as what they show', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 400_000 }), (um) => {
        expect(parseLength(formatMm(um / 1000))).toEqual({ ok: true, valueMm: um / 1000, unit: 'mm' });
        const asFraction = parseLength(nearestFraction(um / 1000 + 0.3).text);
        expect(asFraction.ok && Math.abs(asFraction.valueMm - um / 1000 - 0.3)).toBeLessThanOrEqual(0.1985);
      }),
    );
  });

  it('the nearest 64th is never further than half a step', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 200, noNaN: true }), (mm) => {
        expect(Math.abs(nearestFraction(mm).errorUm)).toBeLessThanOrEqual((25_400 / 128) * 1.000001);
      }),
    );
  });
});

describe('a small difference', () => {
  it.each([
    [97, 'mm', '0.097 mm'],
    [-43, 'mm', '−0.043 mm'],
    // 0.001 in is 25.4 µm exactly.
    [25.4, 'inch', '0.0010 in'],
    [127, 'inch-fraction', '0.0050 in'],
  ] as const)('of %d µm reads in %s as %s', (valueUm, unit, words) =>
    expect(formatDifference(valueUm, unit)).toBe(words),
  );

  it('per side keeps the half micrometre, so that twice of it is the whole', () => {
    expect(formatDifference(48.5, 'mm', 4)).toBe('0.0485 mm');
  });
});
