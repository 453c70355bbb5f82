import { generate } from 'otplib';
import { describe, expect, it } from 'vitest';
import {
  newRecoveryCode,
  newTotpSecret,
  plainRecoveryCode,
  totpStepOf,
  totpUri,
} from '../../../server/security/totp.ts';

/** ASCII "12345678901234567890" in base 32 (RFC 4648): the shared secret of both RFCs' vectors. */
const RFC_SECRET = 'GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ';
const STEP_S = 30;

describe('time-based codes', () => {
  it.each([
    [59, '94287082'],
    [1_111_111_109, '07081804'],
    [1_111_111_111, '14050471'],
    [1_234_567_890, '89005924'],
    [2_000_000_000, '69279037'],
    [20_000_000_000, '65353130'],
  ])('takes the code of RFC 6238, appendix B, at %i s', async (epochS, code) => {
    expect(await totpStepOf(RFC_SECRET, code, epochS, 8)).toBe(Math.floor(epochS / STEP_S));
  });

  it.each(
    // RFC 4226, appendix D, counts 0 to 9.
    ['755224', '287082', '359152', '969429', '338314', '254676', '287922', '162583', '399871', '520489'].map(
      (code, count) => [count, code] as const,
    ),
  )('takes the code of RFC 4226, appendix D, for count %i', async (count, code) => {
    expect(await totpStepOf(RFC_SECRET, code, count * STEP_S)).toBe(count);
  });

  it('takes one step before and after and no more', async () => {
    const secret = newTotpSecret();
    const nowS = 1_800_000_015;
    const codeAt = (epoch: number): Promise<string> => generate({ secret, epoch });
    const stepNow = Math.floor(nowS / STEP_S);
    for (const [shift, step] of [
      [-2, null],
      [-1, stepNow - 1],
      [0, stepNow],
      [1, stepNow + 1],
      [2, null],
    ] as const)
      expect(await totpStepOf(secret, await codeAt(nowS + shift * STEP_S), nowS), `${shift} steps`).toBe(step);
  });

  it.each(['', '12345', '1234567', 'abcdef', '12 34 5', '１２３４５６'])('takes no "%s" for a code', async (code) => {
    expect(await totpStepOf(RFC_SECRET, code, 59)).toBeNull();
  });

  it('makes secrets of 160 bits that differ', () => {
    const secrets = new Set(Array.from({ length: 50 }, newTotpSecret));
    expect(secrets.size).toBe(50);
    // 160 bits are 32 symbols of five bits (RFC 4648).
    for (const secret of secrets) expect(secret).toMatch(/^[A-Z2-7]{32}$/);
  });

  it('writes an address that authenticators read', () => {
    const uri = new URL(totpUri(RFC_SECRET, 'ada@bench.test'));
    expect(uri.protocol).toBe('otpauth:');
    expect(uri.host).toBe('totp');
    expect(decodeURIComponent(uri.pathname)).toBe('/Ferrule:ada@bench.test');
    expect(uri.searchParams.get('secret')).toBe(RFC_SECRET);
    expect(uri.searchParams.get('issuer')).toBe('Ferrule');
  });
});

describe('recovery codes', () => {
  it('have 80 bits in four groups without look-alikes, and differ', () => {
    const codes = Array.from({ length: 500 }, newRecoveryCode);
    expect(new Set(codes).size).toBe(500);
    for (const code of codes) expect(code).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}(-[0-9A-HJKMNP-TV-Z]{4}){3}$/);
    // Every symbol turns up: a generator that loses bits leaves some out.
    expect(new Set(codes.join('').replaceAll('-', '')).size).toBe(32);
  });

  it('are read as people type them', () => {
    expect(plainRecoveryCode('01ab-cdef ghjk-mnpq')).toBe('01ABCDEFGHJKMNPQ');
    expect(plainRecoveryCode('oIab-cdef-ghjk-mnpq')).toBe('01ABCDEFGHJKMNPQ');
  });
});
