import { describe, expect, it } from 'vitest';
import { AppError } from '../../../server/errors.ts';
import { weaknessOf } from '../../../server/security/common-passwords.ts';
import { hashPassword, verifyPassword } from '../../../server/security/passwords.ts';

describe('password hashes', () => {
  it('are Argon2id with 19 MiB, two passes, one lane (OWASP Password Storage Cheat Sheet), and salted', async () => {
    const [one, other] = await Promise.all([hashPassword('salt lantern oil'), hashPassword('salt lantern oil')]);
    expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(one).not.toBe(other);
  });

  it('open to their password alone', async () => {
    const kept = await hashPassword('salt lantern oil');
    expect(await verifyPassword(kept, 'salt lantern oil')).toBe(true);
    expect(await verifyPassword(kept, 'salt lantern oiL')).toBe(false);
  });

  it('open however the keyboard composes accents', async () => {
    const kept = await hashPassword('Tr\u00fcbes \u00d6l am Abend');
    expect(await verifyPassword(kept, 'Tru\u0308bes O\u0308l am Abend')).toBe(true);
  });

  it('are worked out for an account that is not there too, and never open', async () => {
    expect(await verifyPassword(null, 'no account has this password')).toBe(false);
    const took = async (passwordHash: string | null): Promise<number> => {
      const times: number[] = [];
      for (let round = 0; round < 7; round += 1) {
        const from = performance.now();
        await verifyPassword(passwordHash, 'some other words here');
        times.push(performance.now() - from);
      }
      return times.sort((a, b) => a - b)[3] ?? 0;
    };
    const kept = await hashPassword('salt lantern oil');
    const ratio = (await took(null)) / (await took(kept));
    expect(ratio).toBeGreaterThan(0.3);
    expect(ratio).toBeLessThan(3);
  });

  it('are refused as busy when too many wait, and taken again afterwards', async () => {
    const outcomes = await Promise.allSettled(Array.from({ length: 60 }, () => hashPassword('salt lantern oil')));
    const refused = outcomes.filter((outcome) => outcome.status === 'rejected');
    expect(refused.length).toBeGreaterThan(0);
    expect(refused.length).toBeLessThan(60);
    for (const { reason } of refused as { reason: unknown }[]) {
      expect(reason).toBeInstanceOf(AppError);
      expect((reason as AppError).code).toBe('busy');
      expect((reason as AppError).parts.retryAfterS).toBeGreaterThan(0);
    }
    expect(await hashPassword('salt lantern oil')).toMatch(/^\$argon2id\$/);
  });
});

describe('passwords that guessers try first', () => {
  const known = ['ferrule', 'Ada Quillfeather', 'ada.quillfeather@bench.test', 'quillfeather'];

  it.each([
    'passwordpassword',
    'PasswordPassword',
    'correct horse battery staple',
    '1234567890123456',
    'aaaaaaaaaaaaaaaaaaaaaaaa',
    'abababababababab',
    'quillfeather1234',
    'FerruleFerrule12',
    'ferruleferruleferrule',
  ])('refuses "%s"', (password) => {
    expect(weaknessOf(password, known)).toMatch(/choose another/);
  });

  it.each(['salt lantern oil and brass', 'seven grey herons at dusk', 'Jäger mögen trübes Öl 7'])(
    'takes "%s"',
    (password) => {
      expect(weaknessOf(password, known)).toBeNull();
    },
  );
});
