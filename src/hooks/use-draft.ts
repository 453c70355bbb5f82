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
  // Null while nothing was typed: the value then follows what it began from, also when that changes.
  const [held, setHeld] = useState<{ place: string; typed: string | null }>(() => ({ place, typed: read(place) }));
  const typed = held.place === place ? held.typed : read(place);
  const keep = useCallback(
    (next: string) => {
      const kept = next === initial ? null : next;
      setHeld({ place, typed: kept });
      write(place, kept);
    },
    [place, initial],
  );
  const forget = useCallback(() => {
    setHeld({ place, typed: null });
    write(place, null);
  }, [place]);
  return [typed ?? initial, keep, forget];
}
