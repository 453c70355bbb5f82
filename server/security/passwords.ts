import { hash, verify } from '@node-rs/argon2';
import { AppError } from '../errors.ts';

/** OWASP Password Storage Cheat Sheet: Argon2id with 19 MiB, two passes, one lane. Argon2id is the library's default. */
const ARGON2 = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Each hash takes 19 MiB and a core: at most two at once, a short queue, and beyond it a plain "busy". */
const AT_ONCE = 2;
const QUEUE = 32;
let running = 0;
const waiting: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running < AT_ONCE) running += 1;
  else {
    if (waiting.length >= QUEUE)
      throw new AppError('busy', 'Many people are signing in just now. Try again in a moment.', { retryAfterS: 3 });
    // The one who finishes hands its place on, so that nobody who comes later slips in between.
    await new Promise<void>((resolve) => waiting.push(resolve));
  }
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}

/** One keyboard writes é as one character and another as two: both must open (NIST SP 800-63B-4 asks for this). */
const normal = (password: string): string => password.normalize('NFKC');

/** Argon2id in PHC string form. @throws AppError `busy` when too many hashes wait */
export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(normal(password), ARGON2));

/** Hash of a password nobody has, so that an account that is not there takes as long to refuse as one that is. */
const nobodysHash = hash('no account has this password', ARGON2);

/**
 * @param passwordHash null where there is no such account: the work is done all the same, and the answer is no
 * @throws AppError `busy` when too many hashes wait
 */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  const against = passwordHash ?? (await nobodysHash);
  const right = await inTurn(() => verify(against, normal(password)));
  return right && passwordHash !== null;
}
