import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { isProblem } from './api.ts';

const signInAgain = (error: Error): void => {
  if (!isProblem(error, 'not-signed-in') || location.pathname === '/sign-in') return;
  const back = `${location.pathname}${location.search}`;
  location.assign(`/sign-in?back=${encodeURIComponent(back)}`);
};

/** One client per page. A lost sign-in leads to the sign-in page and back; every other refusal is its caller's to show. */
export const createQueryClient = (): QueryClient =>
  new QueryClient({
    queryCache: new QueryCache({ onError: signInAgain }),
    mutationCache: new MutationCache({ onError: signInAgain }),
    defaultOptions: {
      // Offline is told at once, as any other failure; a paused act would send itself later, unasked.
      mutations: { networkMode: 'always' },
      queries: {
        networkMode: 'always',
        staleTime: 30_000,
        retry: (count, error) => count < 2 && (isProblem(error, 'upstream-unavailable') || isProblem(error, 'busy')),
      },
    },
  });
