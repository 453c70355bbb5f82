import { useEffect, useRef } from 'react';
import type { QueryKey } from '@tanstack/react-query';
import type { AnyRoute, RouteInput, RouteOutput } from '../../shared/contracts/route.ts';
import { announce } from '../components/ui/announcer.ts';
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
  toInput: (values: V) => RouteInput<T>;
  stale?: (output: RouteOutput<T>) => readonly QueryKey[];
  onDone?: (output: RouteOutput<T>) => void;
}

/** Brings the reader to what needs attention, in the form they are in. */
function focusFirstInvalid(): void {
  document.activeElement?.closest('form')?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
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
  const values = { ...options.initial, ...(JSON.parse(kept) as V) };
  const latest = useRef({ kept, sent: '' });
  useEffect(() => {
    latest.current.kept = kept;
  });
  const act = useAct(route, {
    ...(options.stale ? { stale: options.stale } : {}),
    onDone: (output) => {
      // What was typed while the answer was on its way was not in it.
      if (latest.current.kept === latest.current.sent) forget();
      announce('Saved.');
      options.onDone?.(output);
    },
  });
  const errors = act.problem?.problem.errors ?? [];
  useEffect(() => {
    if (errors.length > 0) focusFirstInvalid();
    // Only a new set of findings moves the focus, not a new render of the same ones.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [act.problem]);
  const keepAll = (changes: Partial<V>): { all: V; text: string } => {
    const all = { ...values, ...changes };
    const text = JSON.stringify(all);
    keep(text);
    return { all, text };
  };
  const patch = (changes: Partial<V>): void => {
    // A finding is over once its value changes; a refusal of another kind stays in sight until the next try.
    if (act.problem?.code === 'input-invalid') act.forget();
    keepAll(changes);
  };
  return {
    values,
    set: (name, value) => patch({ [name]: value } as unknown as Partial<V>),
    patch,
    errorAt: (pointer) => errors.find((error) => error.pointer === `/body/${pointer}`)?.message,
    submit: (changes = {}) => {
      const { all, text } = keepAll(changes);
      latest.current.sent = text;
      act.run(options.toInput(all));
    },
    act,
    isDraft: kept !== begun,
    forget: () => {
      act.forget();
      forget();
    },
  };
}
