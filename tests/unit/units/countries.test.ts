import { describe, expect, it } from 'vitest';
import { countries, isCountry } from '../../../shared/units/countries.ts';

describe('countries', () => {
  it('are the 249 of ISO 3166-1, each once', () => {
    // The standard's own count of officially assigned alpha-2 codes since 2011, when South Sudan was added.
    expect(countries()).toHaveLength(249);
    expect(new Set(countries().map(({ code }) => code)).size).toBe(249);
  });

  it.each(['DE', 'GB', 'US', 'JP', 'SS', 'AX', 'ZW'])('%s is one', (code) => expect(isCountry(code)).toBe(true));

  it.each(['ZZ', 'XX', 'EU', 'UN', 'UK', 'DD', 'SU', 'XK', 'de', ''])('%s is none', (code) =>
    expect(isCountry(code)).toBe(false),
  );
});
