import type { Currency } from '../contracts/vocabulary.ts';

/** Decimal places of each currency's minor unit (ISO 4217, list one). */
export const MINOR_DIGITS: Readonly<Record<Currency, number>> = { EUR: 2, USD: 2, GBP: 2, JPY: 0, KWD: 3 };

/** "€480.00": the amount in the major unit with its symbol. @param amountMinor whole minor units */
export function formatMinor(amountMinor: number, currency: Currency): string {
  const digits = MINOR_DIGITS[currency];
  return new Intl.NumberFormat('en-GB', {
    style: 'currency',
    currency,
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  }).format(amountMinor / 10 ** digits);
}
