/** How a length is written. The inch is 25.4 mm exactly (international yard and pound agreement, 1959). */
export type LengthUnit = 'mm' | 'inch' | 'inch-fraction';

export const MM_PER_INCH = 25.4;

export type LengthReading =
  | { ok: true; valueMm: number; unit: LengthUnit }
  | { ok: false; reason: 'empty' | 'unreadable' | 'ambiguous' | 'not-positive' | 'zero-denominator'; message: string };

const MARK = /\s*(mm|millimetres?|millimeters?|in|inch|inches|"|″|'')\.?$/i;
const DECIMAL = /^\d+(?:[.,]\d+)?$|^[.,]\d+$/;
const MIXED = /^(?:(\d+)[\s-]+)?(\d+)\s*[/⁄]\s*(\d+)$/;

const refuse = (reason: Extract<LengthReading, { ok: false }>['reason'], message: string): LengthReading => ({
  ok: false,
  reason,
  message,
});

/**
 * Reads a typed length: millimetres (`31.957`, `31,957 mm`), decimal inches (`1.2582 in`, `1.2582"`) or fractions
 * (`1 1/4`, `1-17/64 in`, `63/64"`). A mark in the text wins over `unitHint`, and a fraction is inches in any case.
 *
 * @param unitHint unit of a bare number
 * @returns the value in mm with the unit it was written in, or why it cannot be read
 */
export function parseLength(typed: string, unitHint: LengthUnit = 'mm'): LengthReading {
  const text = typed.trim();
  if (text === '') return refuse('empty', 'Type a reading');
  const mark = MARK.exec(text)?.[1]?.toLowerCase();
  const bare = text.replace(MARK, '').trim();
  if (/^[-−]/.test(bare)) return refuse('not-positive', 'A length is above zero');
  const fraction = MIXED.exec(bare);
  if (fraction) {
    if (mark?.startsWith('m')) return refuse('unreadable', `${typed.trim()} is a fraction in mm; fractions are inches`);
    const [, whole = '0', over = '0', under = '0'] = fraction;
    if (Number(under) === 0) return refuse('zero-denominator', 'A fraction cannot be over zero');
    return positive((Number(whole) + Number(over) / Number(under)) * MM_PER_INCH, 'inch-fraction');
  }
  if (/[.,].*[.,]/.test(bare))
    return refuse('ambiguous', `${typed.trim()} can be read two ways; write one point or comma`);
  if (!DECIMAL.test(bare))
    return refuse('unreadable', `${typed.trim()} is not a length; write 31.95, 1.258 in or 1 17/64`);
  const unit: LengthUnit =
    mark === undefined ? (unitHint === 'inch-fraction' ? 'inch' : unitHint) : mark.startsWith('m') ? 'mm' : 'inch';
  const value = Number(bare.replace(',', '.'));
  return positive(unit === 'mm' ? value : value * MM_PER_INCH, unit);
}

const positive = (valueMm: number, unit: LengthUnit): LengthReading => {
  if (!Number.isFinite(valueMm))
    return refuse('unreadable', 'That is too long to be a length; write 31.95, 1.258 in or 1 17/64');
  return valueMm > 0 ? { ok: true, valueMm, unit } : refuse('not-positive', 'A length is above zero');
};

/**
 * True when a reading is so far from the nominal size that a unit was mixed up (inch for mm, um for mm): more than twice
 * or less than half of it.
 */
export const looksLikeUnitMixUp = (valueMm: number, nominalMm: number): boolean =>
  valueMm > nominalMm * 2 || valueMm < nominalMm / 2;

const MINUS = '−';
const withSign = (value: number, digits: number): string => {
  const text = Math.abs(value).toFixed(digits);
  return value < 0 && Number(text) !== 0 ? `${MINUS}${text}` : text;
};

/** "31.957 mm". */
export const formatMm = (valueMm: number, digits = 3): string => `${withSign(valueMm, digits)} mm`;

/** "−43 µm". */
export const formatUm = (valueUm: number, digits = 0): string => `${withSign(valueUm, digits)} µm`;

const gcd = (one: number, other: number): number => (other === 0 ? one : gcd(other, one % other));

/** The nearest fraction of an inch over `denominator`, and how far it is from the value. */
export function nearestFraction(valueMm: number, denominator = 64): { text: string; errorUm: number } {
  const steps = Math.round((valueMm / MM_PER_INCH) * denominator);
  const whole = Math.floor(steps / denominator);
  const rest = steps % denominator;
  const shrink = gcd(rest, denominator) || 1;
  const fraction = rest === 0 ? '' : `${rest / shrink}/${denominator / shrink}`;
  const text = [whole > 0 || fraction === '' ? String(whole) : '', fraction].filter(Boolean).join(' ');
  return { text: `${text} in`, errorUm: (valueMm - (steps / denominator) * MM_PER_INCH) * 1000 };
}

/** A length in the reader's unit. A fraction that is not exact says so with its error. */
export function formatLength(valueMm: number, unit: LengthUnit): string {
  if (unit === 'mm') return formatMm(valueMm);
  if (unit === 'inch') return `${(valueMm / MM_PER_INCH).toFixed(4)} in`;
  const { text, errorUm } = nearestFraction(valueMm);
  return Math.abs(errorUm) < 0.5 ? text : `${text} ${errorUm > 0 ? '+' : MINUS} ${Math.abs(errorUm).toFixed(0)} µm`;
}

/** A clearance or a removal in the reader's unit; nobody reads such small ones in fractions, so they are decimal inches there too. */
export const formatDifference = (valueUm: number, unit: LengthUnit, digitsOfMm = 3): string =>
  unit === 'mm' ? formatMm(valueUm / 1000, digitsOfMm) : `${withSign(valueUm / 1000 / MM_PER_INCH, digitsOfMm + 1)} in`;
