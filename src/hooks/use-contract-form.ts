import { useEffect, useRef } from 'react';
import type { QueryKey } from '@tanstack/react-query';
import type { AnyRoute, RouteInput, RouteOutput } from '../../shared/contracts/route.ts';
import { useAct, type Act } from './use-act.ts';
import { useDraft } from './use-draft.ts';

export type FormValues = Record<string, string | boolean | readonly string[]>;

export interface ContractForm<T extends AnyRoute, V extends FormValues> {
  values: V;
  set: <K extends keyof V>(name: K, value: V[K]) => void;
  /** Several values at once. */
  patch: (changes: Partial<V>) => void;
  /** What is wrong with a value, by its JSON Pointer below the body: `title`, `readings/0/text`. */
  errorAt: (pointer: string) => string | undefined;
  /** Sends the values, with these changes first. */
  submit: (changes?: Partial<V>) => void;
  act: Act<T>;
  /** Something typed differs from where the form began, and is kept on the device. */
  isDraft: boolean;
  forget: () => void;
}

export interface ContractFormOptions<T extends AnyRoute, V extends FormValues> {
  /** Names the draft. */
  name: string;
  initial: V;
  /** Kept with what is typed from its first letter on: what a draft must know of the record it began from. */
  begunFrom?: Partial<V>;
  toInput: (values: V) => RouteInput<T>;
  stale?: (output: RouteOutput<T>) => readonly QueryKey[];
  /** Told to those who listen, when it is done. */
  said?: string;
  onDone?: (output: RouteOutput<T>) => void;
}

/** Draft of a form in which nothing was typed. */
const NOTHING = '{}';

const same = (one: unknown, other: unknown): boolean => JSON.stringify(one) === JSON.stringify(other);

/**
 * A form of one route: checked by the contract that the server checks by, with the server's own findings at the same
 * fields. What was typed is kept as a draft until it is saved; what was not follows the record or list it came from.
 */
export function useContractForm<T extends AnyRoute, V extends FormValues>(
  route: T,
  options: ContractFormOptions<T, V>,
): ContractForm<T, V> {
  const { initial, begunFrom = {} } = options;
  const [kept, keep, forget] = useDraft(`form-${options.name}`, NOTHING);
  const touched = JSON.parse(kept) as Partial<V>;
  const values = { ...initial, ...touched };
  const latest = useRef({ kept, sent: NOTHING });
  useEffect(() => {
    latest.current.kept = kept;
  });
  const act = useAct(route, {
    ...(options.stale ? { stale: options.stale } : {}),
    said: options.said ?? 'Saved.',
    onDone: (output) => {
      // What was typed while the answer was on its way was not in it.
      if (latest.current.kept === latest.current.sent) forget();
      options.onDone?.(output);
    },
  });
  const keepWith = (changes: Partial<V>): string => {
    const typed = Object.entries({ ...touched, ...changes }).filter(
      ([name, value]) => !(name in begunFrom) && !same(value, initial[name]),
    );
    const text = typed.length === 0 ? NOTHING : JSON.stringify({ ...begunFrom, ...touched, ...changes });
    keep(text);
    return text;
  };
  const patch = (changes: Partial<V>): void => {
    // A finding is over once its value changes; a refusal of another kind stays in sight until the next try.
    if (act.problem?.code === 'input-invalid') act.forget();
    keepWith(changes);
  };
  return {
    values,
    set: (name, value) => patch({ [name]: value } as unknown as Partial<V>),
    patch,
    errorAt: (pointer) => act.problem?.problem.errors?.find((error) => error.pointer === `/body/${pointer}`)?.message,
    submit: (changes = {}) => {
      latest.current.sent = keepWith(changes);
      act.run(options.toInput({ ...values, ...changes }));
    },
    act,
    isDraft: kept !== NOTHING,
    forget: () => {
      act.forget();
      forget();
    },
  };
}
