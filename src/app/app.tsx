import { QueryClientProvider } from '@tanstack/react-query';
import { RouterProvider } from 'react-router-dom';
import { LiveRegion } from '../components/ui/live-region.tsx';
import { createQueryClient } from '../lib/query-client.ts';
import { followRealtime } from './realtime-invalidation.ts';
import { createRouter } from './router.tsx';

const queryClient = createQueryClient();
const router = createRouter(queryClient);
followRealtime(queryClient);

export function App() {
  return (
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
      <LiveRegion />
    </QueryClientProvider>
  );
}
