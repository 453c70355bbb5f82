import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { openField, sealField } from '../../../server/security/field-cipher.ts';
import { hashToken, newLinkToken } from '../../../server/security/tokens.ts';

const KEY = '00112233445566778899aabbccddeeff'.repeat(2);
const OTHER_KEY = 'ffeeddccbbaa99887766554433221100'.repeat(2);

describe('sealed fields', () => {
  it('open with their key, and look different each time', () => {
    const sealed = sealField(KEY, 'GEZDGNBVGY3TQOJQ');
    expect(openField(KEY, sealed)).toBe('GEZDGNBVGY3TQOJQ');
    expect(sealed).not.toBe(sealField(KEY, 'GEZDGNBVGY3TQOJQ'));
    expect(Buffer.from(sealed, 'base64url').toString('latin1')).not.toContain('GEZD');
  });

  it('do not open with another key, nor when any byte was changed', () => {
    const sealed = sealField(KEY, 'GEZDGNBVGY3TQOJQ');
    expect(() => openField(OTHER_KEY, sealed)).toThrow();
    const bytes = Buffer.from(sealed, 'base64url');
    for (let at = 0; at < bytes.length; at += 1) {
      const changed = Buffer.from(bytes);
      changed.writeUInt8(changed.readUInt8(at) ^ 1, at);
      expect(() => openField(KEY, changed.toString('base64url')), `byte ${at}`).toThrow();
    }
  });

  it('do not open when the tag was cut off', () => {
    const bytes = Buffer.from(sealField(KEY, ''), 'base64url');
    expect(() => openField(KEY, bytes.subarray(0, 16).toString('base64url'))).toThrow();
  });
});

describe('link tokens', () => {
  it('have 256 bits, fit into an address, and only their SHA-256 is kept', () => {
    const { token, tokenHash } = newLinkToken();
    expect(token).toMatch(/^[\w-]{43}$/);
    expect(tokenHash).toBe(createHash('sha256').update(token).digest('hex'));
    expect(hashToken(token)).toBe(tokenHash);
    expect(newLinkToken().token).not.toBe(token);
  });
});
