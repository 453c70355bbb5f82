import { StaleRevision } from '../errors.ts';

/** Refuses a save that started from an older revision, with the record as the caller may see it now. */
export function guardRevision(row: { revision: number }, revision: number, current: () => unknown): void {
  if (row.revision !== revision) throw new StaleRevision(current());
}

/** Keeps only the values that were sent, so that a field left out stays as it is. */
export const given = <T extends object>(changes: T): Partial<T> =>
  Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined)) as Partial<T>;
