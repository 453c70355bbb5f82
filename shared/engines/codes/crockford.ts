/**
 * Crockford's base 32 with a check symbol (D. Crockford, "Base 32", public page): ten digits and the alphabet without
 * I, L, O and U; the check symbol is the value modulo 37 and may also be one of `* ~ $ = U`.
 */
const SYMBOLS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
const CHECK_SYMBOLS = `${SYMBOLS}*~$=U`;

/** Symbols of a commission code before its check symbol: 35 bits. */
export const CODE_SYMBOLS = 7;

/** Check symbol of a value. */
export const checkSymbol = (value: bigint): string => CHECK_SYMBOLS.charAt(Number(value % 37n));

/** A non-negative value in base 32, padded with zeros to `length`, without a check symbol. */
export function encodeBase32(value: bigint, length: number): string {
  if (value < 0n || value >= 32n ** BigInt(length)) throw new RangeError(`The value does not fit ${length} symbols`);
  let text = '';
  for (let rest = value; text.length < length; rest /= 32n) text = SYMBOLS.charAt(Number(rest % 32n)) + text;
  return text;
}

/** Upper case, without the hyphens and spaces people put in, and with the look-alikes I, L and O read as digits. */
const normalise = (text: string): string =>
  text.toUpperCase().replace(/[\s-]/g, '').replace(/[IL]/g, '1').replace(/O/g, '0');

const decodeBase32 = (text: string): bigint | null => {
  let value = 0n;
  for (const symbol of text) {
    const digit = SYMBOLS.indexOf(symbol);
    if (digit < 0) return null;
    value = value * 32n + BigInt(digit);
  }
  return value;
};

/** A commission's code as it is stored: seven symbols and the check symbol. */
export const encodeCode = (value: bigint): string => encodeBase32(value, CODE_SYMBOLS) + checkSymbol(value);

/** In two groups of four, as it is spoken and printed. */
export const showCode = (code: string): string => `${code.slice(0, 4)} ${code.slice(4)}`;

export type CodeReading = { ok: true; code: string } | { ok: false; words: string };

/** Reads a typed or scanned code leniently and says what is wrong with one that does not hold. */
export function readCode(typed: string): CodeReading {
  const text = normalise(typed);
  if (text.length !== CODE_SYMBOLS + 1)
    return { ok: false, words: `A code has ${CODE_SYMBOLS + 1} characters; this has ${text.length}.` };
  const value = decodeBase32(text.slice(0, CODE_SYMBOLS));
  const check = text.charAt(CODE_SYMBOLS);
  if (value === null || !CHECK_SYMBOLS.includes(check))
    return { ok: false, words: 'A code has digits and letters only, and no U before its last character.' };
  if (checkSymbol(value) !== check)
    return { ok: false, words: 'One character of this code is wrong; the last one does not match the others.' };
  return { ok: true, code: text };
}
