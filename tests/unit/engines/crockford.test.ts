import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkSymbol, encodeBase32, encodeCode, readCode, showCode } from '../../../shared/engines/codes/crockford.ts';

// D. Crockford, "Base 32": value modulo 37, symbols 0-9 A-Z without I L O U, then * ~ $ = U. 1234 is 16J with check D (worked by hand: 1234 mod 37 = 13).
describe('Crockford base 32', () => {
  it('follows the published alphabet and modulus', () => {
    expect(encodeBase32(1234n, 3)).toBe('16J');
    expect(checkSymbol(1234n)).toBe('D');
    expect([32n, 33n, 34n, 35n, 36n].map(checkSymbol)).toEqual(['*', '~', '$', '=', 'U']);
  });

  const values = fc.bigInt({ min: 0n, max: 2n ** 35n - 1n });

  it('reads back what it wrote, however it is typed', () => {
    fc.assert(
      fc.property(values, (value) => {
        const code = encodeCode(value);
        for (const typed of [code, showCode(code), code.toLowerCase(), code.slice(0, 3) + '-' + code.slice(3)])
          expect(readCode(typed)).toEqual({ ok: true, code });
        expect(readCode(code.replaceAll('1', 'l').replaceAll('0', 'o'))).toEqual({ ok: true, code });
      }),
    );
  });

  it('catches every single wrong symbol', () => {
    const symbols = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
    fc.assert(
      fc.property(values, fc.nat(6), fc.nat(31), (value, place, other) => {
        const code = encodeCode(value);
        const wrong = code.slice(0, place) + symbols.charAt(other) + code.slice(place + 1);
        expect(readCode(wrong).ok).toBe(wrong === code);
      }),
    );
  });

  it('says what is wrong', () => {
    expect(readCode('123')).toMatchObject({ ok: false, words: expect.stringContaining('8 characters') as string });
    expect(readCode('U234 5678')).toMatchObject({ ok: false });
    expect(() => encodeBase32(2n ** 35n, 7)).toThrow(RangeError);
  });
});
