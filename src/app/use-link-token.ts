import { useState } from 'react';

/** The token of a letter's link. It is read from the fragment once and taken out of the address at once. */
function takeLinkToken(): string | null {
  const found = new URLSearchParams(location.hash.slice(1)).get('token');
  if (found) history.replaceState(history.state, '', location.pathname);
  return found;
}

export function useLinkToken(): string | null {
  const [token] = useState(takeLinkToken);
  return token;
}

const PLACE = 'ferrule-invitation';

/** As `useLinkToken`, kept in this tab over a sign-in on the way, until it is used. */
export function useInvitationToken(): { token: string | null; forget: () => void } {
  const [token] = useState(() => {
    const found = takeLinkToken();
    if (found) sessionStorage.setItem(PLACE, found);
    return found ?? sessionStorage.getItem(PLACE);
  });
  return { token, forget: () => sessionStorage.removeItem(PLACE) };
}
