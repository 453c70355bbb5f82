import { createHash, randomBytes } from 'node:crypto';

/** SHA-256, hexadecimal: what is kept of a token that has 128 bits or more, so that no salt is needed. */
export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');

/** 256 random bits for a link, and the hash that is kept of them. */
export function newLinkToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, tokenHash: hashToken(token) };
}
