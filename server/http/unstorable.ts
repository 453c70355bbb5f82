import type { ProblemError } from '../../shared/problems/problems.ts';

const MESSAGE = 'This has a character that cannot be kept: a null character or half of a pair';

const LONE_SURROGATE = /\p{Surrogate}/u;

/**
 * Texts that PostgreSQL cannot keep, wherever they are: U+0000, and halves of surrogate pairs, which are no Unicode text.
 * @returns one error for each, by JSON Pointer (RFC 6901)
 */
export function unstorableIn(place: 'body' | 'query', value: unknown): ProblemError[] {
  const found: ProblemError[] = [];
  const walk = (pointer: string, inner: unknown): void => {
    if (typeof inner === 'string') {
      if (inner.includes('\u0000') || LONE_SURROGATE.test(inner)) found.push({ pointer, message: MESSAGE });
    } else if (typeof inner === 'object' && inner !== null)
      for (const [key, one] of Object.entries(inner))
        walk(`${pointer}/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`, one);
  };
  walk(`/${place}`, value);
  return found;
}
