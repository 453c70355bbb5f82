import { useEffect, useState } from 'react';
import type { QueryKey } from '@tanstack/react-query';
import type { AnyRoute, RouteInput, RouteOutput } from '../../shared/contracts/route.ts';
import type { ProblemError } from '../../shared/problems/problems.ts';
import { ownProblem } from '../lib/api.ts';
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
  /** Its problem is also what the contract found before anything was sent: no finding is without a place on the page. */
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
  const [found, setFound] = useState<readonly ProblemError[]>([]);
  const values = { ...options.initial, ...(JSON.parse(kept) as V) };
  const [sent, setSent] = useState('');
  const sending = useAct(route, {
    ...(options.stale ? { stale: options.stale } : {}),
    onDone: (output) => {
      // What was typed while the answer was on its way was not in it.
      if (kept === sent) forget();
      options.onDone?.(output);
    },
  });
  const act: Act<T> = {
    ...sending,
    run: (input) => {
      setSent(kept);
      sending.run(input);
    },
  };
  const errors = found.length > 0 ? found : (act.problem?.problem.errors ?? []);
  useEffect(() => {
    if (errors.length > 0) focusFirstInvalid();
    // Only a new set of findings moves the focus, not a new render of the same ones.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [found, act.problem]);
  const patch = (changes: Partial<V>): void => {
    setFound([]);
    keep(JSON.stringify({ ...values, ...changes }));
  };
  return {
    values,
    set: (name, value) => patch({ [name]: value } as unknown as Partial<V>),
    patch,
    errorAt: (pointer) => errors.find((error) => error.pointer === `/body/${pointer}`)?.message,
    submit: () => {
      const input = options.toInput(values);
      const parsed = route.body.safeParse((input as { body?: unknown }).body ?? {});
      setFound(
        (parsed.error?.issues ?? []).map((issue) => ({
          pointer: `/body/${issue.path.map(String).join('/')}`,
          message: issue.message,
        })),
      );
      if (parsed.success) act.run(input);
    },
    act: found.length > 0 ? { ...act, problem: ownProblem('input-invalid', 'Nothing was sent yet.', found) } : act,
    isDraft: kept !== begun,
    forget,
  };
}
