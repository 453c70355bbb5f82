import type { ReactNode } from 'react';
import type { QueryKey } from '@tanstack/react-query';
import type { AnyRoute, RouteInput } from '../../shared/contracts/route.ts';
import { useContractForm, type ContractForm, type FormValues } from './use-contract-form.ts';

interface Revised {
  revision: number;
}

/** A value of a form that a record was opened with, and how it reads on the page. */
export interface EditedValue<V extends FormValues> {
  name: keyof V & string;
  label: string;
  /** Words for a value that is an identifier or a code. */
  words?: (value: V[keyof V]) => ReactNode;
}

export interface EditFormOptions<T extends AnyRoute, R extends Revised, V extends FormValues> {
  /** Names the draft. */
  name: string;
  record: R;
  toValues: (record: R) => V;
  toInput: (values: V, revision: number) => RouteInput<T>;
  /** Every value that two people can have changed at once. */
  edited: readonly EditedValue<V>[];
  stale: () => readonly QueryKey[];
}

/** One value that two people changed: theirs and the reader's, and the way to take theirs. */
export interface Difference {
  name: string;
  label: string;
  mine: ReactNode;
  theirs: ReactNode;
  takeTheirs: () => void;
}

export interface Conflict {
  differences: readonly Difference[];
  /** Saves what stands in the form over what was saved in the meantime. */
  saveMine: () => void;
}

export interface EditForm<T extends AnyRoute, V extends FormValues> extends ContractForm<T, V & { revision: string }> {
  /** Set once the record was saved by someone else since this form began. */
  conflict: Conflict | null;
}

const wordsOf = (value: FormValues[string]): ReactNode =>
  value === '' || (Array.isArray(value) && value.length === 0) ? 'none' : String(value);

/**
 * A form that changes a record. The revision it began from is among its values, so that a draft knows it over a reload;
 * a save that comes too late gets what was saved instead, beside what was typed.
 */
export function useEditForm<T extends AnyRoute, R extends Revised, V extends FormValues>(
  route: T,
  options: EditFormOptions<T, R, V>,
): EditForm<T, V> {
  const revision = { revision: options.record.revision.toString() };
  const form = useContractForm<T, V & { revision: string }>(route, {
    name: options.name,
    initial: { ...options.toValues(options.record), ...revision },
    begunFrom: revision as Partial<V & { revision: string }>,
    toInput: (values) => options.toInput(values, Number(values.revision)),
    stale: options.stale,
  });
  const problem = form.act.problem;
  if (problem?.code !== 'stale-revision') return { ...form, conflict: null };
  const saved = problem.problem.current as R;
  const theirs = options.toValues(saved);
  const conflict: Conflict = {
    differences: options.edited
      .filter(({ name }) => JSON.stringify(form.values[name]) !== JSON.stringify(theirs[name]))
      .map(({ name, label, words = wordsOf }) => ({
        name,
        label,
        mine: words(form.values[name]),
        theirs: words(theirs[name]),
        takeTheirs: () => form.patch({ [name]: theirs[name] } as unknown as Partial<V & { revision: string }>),
      })),
    saveMine: () =>
      form.submit({ revision: saved.revision.toString() } as unknown as Partial<V & { revision: string }>),
  };
  return { ...form, conflict };
}
