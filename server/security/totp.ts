import { randomBytes } from 'node:crypto';
import { generateSecret, generateURI, verify } from 'otplib';
import { encodeBase32 } from '../../shared/engines/codes/crockford.ts';

const PERIOD_S = 30;

/** A new shared secret, 160 bits in base 32 (RFC 4226 recommends 160). */
export const newTotpSecret = (): string => generateSecret({ length: 20 });

/** Address for an authenticator's QR code. */
export const totpUri = (secret: string, label: string): string =>
  generateURI({ issuer: 'Ferrule', label, secret, digits: 6, period: PERIOD_S });

/**
 * The time step of a right code, or null (RFC 6238, SHA-1, 30 s). One step before and after is taken, for clocks that are
 * a little off.
 * @param digits 6 in the product; the RFC's test vectors have 8
 */
export async function totpStepOf(
  secret: string,
  code: string,
  epochS: number,
  digits: 6 | 8 = 6,
): Promise<number | null> {
  const typed = code.replace(/\s/g, '');
  if (!new RegExp(`^\\d{${digits}}$`).test(typed)) return null;
  const result = await verify({
    secret,
    token: typed,
    epoch: epochS,
    epochTolerance: PERIOD_S,
    period: PERIOD_S,
    digits,
  });
  return result.valid && 'timeStep' in result ? result.timeStep : null;
}

export const RECOVERY_CODES = 10;

/** 80 random bits in four groups, read out easily: Crockford's base 32 has no I, L, O or U. */
export const newRecoveryCode = (): string => {
  const text = encodeBase32(BigInt(`0x${randomBytes(10).toString('hex')}`), 16);
  return (text.match(/.{4}/g) ?? []).join('-');
};

/** As it is hashed: upper case, without hyphens and spaces, look-alikes read as digits. */
export const plainRecoveryCode = (typed: string): string =>
  typed.toUpperCase().replace(/[\s-]/g, '').replace(/[IL]/g, '1').replace(/O/g, '0');
