import { useMutation, useQueryClient, type QueryKey } from '@tanstack/react-query';
import { useRef } from 'react';
import type { AnyRoute, RouteInput, RouteOutput } from '../../shared/contracts/route.ts';
import { announce } from '../components/ui/announcer.ts';
import { api, ApiProblem, ownProblem } from '../lib/api.ts';

export interface ActOptions<T extends AnyRoute> {
  /** Told to those who listen, when it is done. */
  said?: string;
  /** Queries that the act makes stale, besides what its realtime event tells. */
  stale?: (output: RouteOutput<T>) => readonly QueryKey[];
  onDone?: (output: RouteOutput<T>) => void;
}

export interface Act<T extends AnyRoute> {
  run: (input: RouteInput<T>) => void;
  pending: boolean;
  problem: ApiProblem | null;
  forget: () => void;
}

/** Whatever else went wrong is said too: a button that does nothing at all would be worse. */
const problemFrom = (error: Error | null): ApiProblem | null =>
  error === null || error instanceof ApiProblem
    ? error
    : ownProblem('unexpected', 'What you wrote is kept. Load the page again and try once more.');

/** The button that was pressed may be gone with what it stood for; the focus then goes to the page's heading, not nowhere. */
const keepFocus = (): void =>
  void requestAnimationFrame(() => {
    if (document.activeElement === document.body) document.querySelector<HTMLElement>('h1')?.focus();
  });

/**
 * One act of the API behind a button. A try that failed is sent again under the same idempotency key, so that pressing
 * twice, or again after a lost connection, does it once.
 */
export function useAct<T extends AnyRoute>(route: T, options: ActOptions<T> = {}): Act<T> {
  const queryClient = useQueryClient();
  const running = useRef(false);
  const key = useRef<{ body: string; value: string } | null>(null);
  const mutation = useMutation<RouteOutput<T>, Error, RouteInput<T>>({
    mutationFn: (input) => {
      // Another body is another act: it must not be refused as a reuse of the first one's key.
      const body = JSON.stringify(input);
      if (key.current?.body !== body) key.current = { body, value: crypto.randomUUID() };
      return api(route, input, { idempotencyKey: key.current.value });
    },
    onSettled: () => void (running.current = false),
    onSuccess: async (output) => {
      key.current = null;
      await Promise.all((options.stale?.(output) ?? []).map((queryKey) => queryClient.invalidateQueries({ queryKey })));
      options.onDone?.(output);
      if (options.said) announce(options.said);
      keepFocus();
    },
  });
  return {
    run: (input) => {
      // A second press can come before the first one is shown to be on its way.
      if (running.current) return;
      running.current = true;
      mutation.mutate(input);
    },
    pending: mutation.isPending,
    problem: problemFrom(mutation.error),
    forget: mutation.reset,
  };
}
