import { useState } from 'react';
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
  submit: () => void;
  act: Act<T>;
  /** Something typed differs from where the form began, and is kept on the device. */
  isDraft: boolean;
  forget: () => void;
}

export interface ContractFormOptions<T extends AnyRoute, V extends FormValues> {
  /** Names the draft. */
  name: string;
  initial: V;
  toInput: (values: V) => RouteInput<T>;
  stale?: (output: RouteOutput<T>) => readonly QueryKey[];
  onDone?: (output: RouteOutput<T>) => void;
}

/**
 * A form of one route: checked by the contract that the server checks by, with the server's own findings at the same
 * fields, and every value kept as a draft until it is saved.
 */
export function useContractForm<T extends AnyRoute, V extends FormValues>(
  route: T,
  options: ContractFormOptions<T, V>,
): ContractForm<T, V> {
  const begun = JSON.stringify(options.initial);
  const [kept, keep, forget] = useDraft(`form-${options.name}`, begun);
  const [found, setFound] = useState<Record<string, string>>({});
  const values = { ...options.initial, ...(JSON.parse(kept) as V) };
  const act = useAct(route, {
    ...(options.stale ? { stale: options.stale } : {}),
    onDone: (output) => {
      forget();
      options.onDone?.(output);
    },
  });
  const fromServer = Object.fromEntries(
    (act.problem?.problem.errors ?? []).map((error) => [error.pointer.replace(/^\/body\//, ''), error.message]),
  );
  const patch = (changes: Partial<V>): void => {
    setFound({});
    keep(JSON.stringify({ ...values, ...changes }));
  };
  return {
    values,
    set: (name, value) => patch({ [name]: value } as unknown as Partial<V>),
    patch,
    errorAt: (pointer) => found[pointer] ?? fromServer[pointer],
    submit: () => {
      const input = options.toInput(values);
      const parsed = route.body.safeParse((input as { body?: unknown }).body ?? {});
      setFound(
        parsed.success
          ? {}
          : Object.fromEntries(parsed.error.issues.map((issue) => [issue.path.join('/'), issue.message])),
      );
      if (parsed.success) act.run(input);
    },
    act,
    isDraft: kept !== begun,
    forget,
  };
}
