import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { meQuery } from '../lib/queries/me.ts';
import { RouteProblem } from './route-problem.tsx';
import { SignedInShell } from './shell.tsx';

type LazyPage = () => Promise<{ Component: () => React.ReactNode }>;

const page = (path: string | undefined, lazy: LazyPage): RouteObject => ({
  ...(path === undefined ? { index: true } : { path }),
  lazy,
  ErrorBoundary: RouteProblem,
});

const inCommission: RouteObject[] = [
  page(undefined, () => import('./routes/room.tsx')),
  page('plan', () => import('./routes/plan.tsx')),
  page('parties', () => import('./routes/parties.tsx')),
  page('joints/:jointId', () => import('./routes/joint.tsx')),
  page('reports/:reportId', () => import('./routes/report.tsx')),
  page('handoffs/:handoffId', () => import('./routes/handoff.tsx')),
  page('threads', () => import('./routes/threads.tsx')),
  page('threads/:threadId', () => import('./routes/thread.tsx')),
  page('pictures', () => import('./routes/pictures.tsx')),
  page('history', () => import('./routes/history.tsx')),
  page('edit', () => import('./routes/commission-edit.tsx')),
];

/** Every page of the product; each is loaded when it is first opened. */
export const createRouter = (queryClient: QueryClient) =>
  createBrowserRouter([
    page('/sign-in', () => import('./routes/sign-in.tsx')),
    page('/reset', () => import('./routes/reset.tsx')),
    page('/invitation', () => import('./routes/invitation.tsx')),
    {
      path: '/',
      Component: SignedInShell,
      ErrorBoundary: RouteProblem,
      loader: async () => {
        await queryClient.prefetchQuery(meQuery());
        return null;
      },
      HydrateFallback: () => null,
      children: [
        page(undefined, () => import('./routes/bench.tsx')),
        page('commissions', () => import('./routes/commissions.tsx')),
        page('commissions/new', () => import('./routes/commission-new.tsx')),
        {
          path: 'commissions/:commissionId',
          lazy: () => import('./routes/commission-layout.tsx'),
          ErrorBoundary: RouteProblem,
          children: inCommission,
        },
        page('account', () => import('./routes/account.tsx')),
        page('shops', () => import('./routes/shops.tsx')),
        page('shops/:shopId', () => import('./routes/shop.tsx')),
        page('api-reference', () => import('./routes/api-reference.tsx')),
        page('*', () => import('./routes/not-found.tsx')),
      ],
    },
  ]);
