import { describe, expect, it } from 'vitest';
import { CURRENCIES } from '../../../shared/contracts/vocabulary.ts';
import { formatMinor, MINOR_DIGITS } from '../../../shared/units/money.ts';

describe('amounts', () => {
  it('have the minor units of ISO 4217 (list one)', () =>
    expect(MINOR_DIGITS).toEqual({ EUR: 2, USD: 2, GBP: 2, JPY: 0, KWD: 3 }));

  it.each([
    [48_000, 'EUR', '€480.00'],
    [5, 'GBP', '£0.05'],
    [123_456_789, 'USD', 'US$1,234,567.89'],
    [480, 'JPY', 'JP¥480'],
    [1_234, 'KWD', 'KWD 1.234'],
    [-4_500, 'EUR', '-€45.00'],
    [0, 'EUR', '€0.00'],
  ] as const)('%s minor units of %s read %s', (amountMinor, currency, words) => {
    // The space between a code and its figure does not break.
    expect(formatMinor(amountMinor, currency).replaceAll('\u00a0', ' ')).toBe(words);
  });

  it('agree with the digits the language has for each currency', () => {
    for (const currency of CURRENCIES)
      expect(new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions().maximumFractionDigits).toBe(
        MINOR_DIGITS[currency],
      );
  });
});
