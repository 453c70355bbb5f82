import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import type { AccountView } from '../../shared/contracts/accounts.ts';
import { keys } from '../lib/query-keys.ts';

/** Storage may be full or closed to us; then a draft lives as long as its page. */
const read = (name: string): string | null => {
  try {
    return localStorage.getItem(name);
  } catch {
    return null;
  }
};

const write = (name: string, value: string | null): void => {
  try {
    if (value === null) localStorage.removeItem(name);
    else localStorage.setItem(name, value);
  } catch {
    // nothing to do: the value is still in the page
  }
};

/**
 * A typed value that survives reload, sign-out and a dead network: kept on the device, per person and name, until it is
 * sent and forgotten.
 *
 * @returns the value, its setter, and what forgets it after a success
 */
export function useDraft(name: string, initial: string): [string, (value: string) => void, () => void] {
  const accountId = useQueryClient().getQueryData<AccountView>(keys.me())?.id ?? 'anyone';
  const place = `ferrule-draft:${accountId}:${name}`;
  const [held, setHeld] = useState<{ place: string; value: string }>(() => ({ place, value: read(place) ?? initial }));
  const value = held.place === place ? held.value : (read(place) ?? initial);
  const keep = useCallback(
    (next: string) => {
      setHeld({ place, value: next });
      write(place, next === '' || next === initial ? null : next);
    },
    [place, initial],
  );
  const forget = useCallback(() => {
    setHeld({ place, value: initial });
    write(place, null);
  }, [place, initial]);
  return [value, keep, forget];
}
