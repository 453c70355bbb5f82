import { describe, expect, it } from 'vitest';
import { createJoint } from '../../../shared/contracts/joints.ts';
import { figureFrom, minorFrom, optionalFigureFrom } from '../../../src/lib/figures.ts';

describe('a typed figure', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    [' 0 ', 0],
    ['−25', -25],
    ['-25', -25],
  ])('%s is read', (text, figure) => expect(figureFrom(text)).toBe(figure));

  it.each(['', '  ', 'abc', '1,250.00', '12 mm'])('"%s" is none, and is never taken for zero', (text) =>
    expect(figureFrom(text)).toBeNaN(),
  );

  it('may be left out where it is optional, and is still checked where it is given', () => {
    expect(optionalFigureFrom(' ')).toBeNull();
    expect(optionalFigureFrom('x')).toBeNaN();
  });

  it('that is none is refused by the contract with the name of its field', () => {
    const refused = createJoint.body.safeParse({ nominalMm: figureFrom('abc') });
    expect(refused.error?.issues.find((issue) => issue.path[0] === 'nominalMm')?.message).toBe(
      'Write a number such as 12 or 12.5',
    );
  });
});

describe('a typed amount', () => {
  // Decimal places from ISO 4217, list one.
  it.each([
    ['480', 'EUR', 48000],
    ['1.15', 'EUR', 115],
    ['1,005', 'KWD', 1005],
    ['480', 'JPY', 480],
  ] as const)('%s %s is %d in the minor unit', (text, currency, minor) =>
    expect(minorFrom(text, currency)).toBe(minor),
  );

  it('with more decimals than its currency has is not rounded unasked', () => {
    expect(minorFrom('12.345', 'EUR')).toBe(1234.5);
    expect(minorFrom('0.5', 'JPY')).toBe(0.5);
  });
});
