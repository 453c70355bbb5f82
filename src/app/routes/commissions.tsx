import { useSuspenseQuery } from '@tanstack/react-query';
import { CommissionsPage } from '../../features/commissions/components/commissions-page.tsx';
import { meQuery } from '../../lib/queries/me.ts';

export function Component() {
  const { data: me } = useSuspenseQuery(meQuery());
  return <CommissionsPage mayOpen={me.shops.some((shop) => shop.role !== 'bookkeeper')} />;
}
