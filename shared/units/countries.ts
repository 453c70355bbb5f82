/** Reserved, transitional and user-assigned codes that CLDR names, and that ISO 3166-1 assigns to no country. */
const NOT_ASSIGNED = new Set('AC AN CP CQ CS DG EA EU EZ IC QO TA UN XA XB XK ZZ'.split(' '));

const LETTERS = [...'ABCDEFGHIJKLMNOPQRSTUVWXYZ'];

/** A code that was replaced by another one is written as that one by CLDR. */
const isCurrent = (code: string): boolean => new Intl.Locale(`und-${code}`).region === code;

interface Country {
  code: string;
  name: string;
}

function readCountries(): Country[] {
  const names = new Intl.DisplayNames('en', { type: 'region', fallback: 'none' });
  return LETTERS.flatMap((first) => LETTERS.map((second) => first + second))
    .filter((code) => !NOT_ASSIGNED.has(code) && isCurrent(code))
    .flatMap((code) => {
      const name = names.of(code);
      return name ? [{ code, name }] : [];
    })
    .sort((one, other) => one.name.localeCompare(other.name, 'en'));
}

let known: readonly Country[] | undefined;

/** Countries by their alpha-2 code (ISO 3166-1), with their English names from CLDR, in the order of the names. */
export const countries = (): readonly Country[] => (known ??= readCountries());

export const isCountry = (code: string): boolean => countries().some((country) => country.code === code);
