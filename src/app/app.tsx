import { QueryClientProvider } from '@tanstack/react-query';
import { BrowserRouter } from 'react-router-dom';
import { LiveRegion } from '../components/ui/live-region.tsx';
import { createQueryClient } from '../lib/query-client.ts';
import { fetchPagesOf } from './pages.ts';
import { followRealtime } from './realtime-invalidation.ts';
import { Router } from './router.tsx';

const queryClient = createQueryClient();
followRealtime(queryClient);
fetchPagesOf(location.pathname);

export function App() {
  return (
    <QueryClientProvider client={queryClient}>
      <BrowserRouter>
        <Router />
      </BrowserRouter>
      <LiveRegion />
    </QueryClientProvider>
  );
}
