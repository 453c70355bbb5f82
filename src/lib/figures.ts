import type { Currency } from '../../shared/contracts/vocabulary.ts';
import { MINOR_DIGITS } from '../../shared/units/money.ts';

/** A typed figure with a point or a comma; NaN for what is none, which every contract refuses by its field. */
export const figureFrom = (text: string): number => {
  const bare = text.trim().replace(',', '.').replace('−', '-');
  return bare === '' ? Number.NaN : Number(bare);
};

/** As `figureFrom`; nothing typed is no figure, and allowed to be. */
export const optionalFigureFrom = (text: string): number | null => (text.trim() === '' ? null : figureFrom(text));

/**
 * A typed amount in the minor unit of its currency. More decimals than the currency has are kept, so that the contract
 * refuses them instead of someone's money being rounded unasked.
 */
export const minorFrom = (text: string, currency: Currency): number =>
  Number((figureFrom(text) * 10 ** MINOR_DIGITS[currency]).toFixed(6));
