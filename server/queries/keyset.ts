import { InputInvalid } from '../errors.ts';

/** A page's end as an opaque word: the sort values of its last row. */
export const encodeCursor = (values: readonly string[]): string =>
  Buffer.from(JSON.stringify(values)).toString('base64url');

export function decodeCursor(cursor: string, length: number): string[] {
  try {
    const values: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (Array.isArray(values) && values.length === length && values.every((value) => typeof value === 'string'))
      return values;
  } catch {
    // falls through to the one answer for a cursor that is not ours
  }
  throw new InputInvalid([
    { pointer: '/query/cursor', message: 'This page mark is not one of ours; start from the first page' },
  ]);
}
