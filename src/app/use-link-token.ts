import { useState } from 'react';

/** The token of a letter's link. It is read from the fragment once and taken out of the address at once. */
export function useLinkToken(): string | null {
  const [token] = useState(() => {
    const found = new URLSearchParams(location.hash.slice(1)).get('token');
    if (found) history.replaceState(history.state, '', location.pathname);
    return found;
  });
  return token;
}
