import { InputInvalid } from '../errors.ts';

/** As PostgreSQL writes them. */
const CURSOR_FORMS = {
  instant: /^\d{4}-\d{2}-\d{2} \d{2}:\d{2}:\d{2}(?:\.\d{1,6})?[+-]\d{2}(?::\d{2})?$/,
  uuid: /^[0-9a-f]{8}-(?:[0-9a-f]{4}-){3}[0-9a-f]{12}$/,
  number: /^\d{1,18}$/,
};
type CursorForm = keyof typeof CURSOR_FORMS;

/** A page's end as an opaque word: the sort values of its last row. */
export const encodeCursor = (values: readonly string[]): string =>
  Buffer.from(JSON.stringify(values)).toString('base64url');

/** @param forms what each value has to look like; a mark that was made up must not reach a statement */
export function decodeCursor(cursor: string, forms: readonly CursorForm[]): string[] {
  try {
    const values: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (
      Array.isArray(values) &&
      values.length === forms.length &&
      values.every((value, index) => typeof value === 'string' && CURSOR_FORMS[forms[index] ?? 'number'].test(value))
    )
      return values as string[];
  } catch {
    // falls through to the one answer for a cursor that is not ours
  }
  throw new InputInvalid([
    { pointer: '/query/cursor', message: 'This page mark is not one of ours; start from the first page' },
  ]);
}
