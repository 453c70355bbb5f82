import { useSuspenseQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { EmptyState } from '../../components/ui/empty-state.tsx';
import { Page, PageHeading } from '../../components/ui/page.tsx';
import { NewCommissionForm } from '../../features/commissions/components/commission-form.tsx';
import { meQuery } from '../../lib/queries/me.ts';

export function Component() {
  const navigate = useNavigate();
  const { data: me } = useSuspenseQuery(meQuery());
  const shops = me.shops.filter((shop) => shop.role !== 'bookkeeper');
  return (
    <Page>
      <PageHeading
        title="Open a commission"
        headline="The brief first; shops, client, parts and legs follow on its own page."
      />
      {shops.length === 0 ? (
        <EmptyState title="Only a shop opens commissions">
          You belong to none yet. A shop's owner can invite you.
        </EmptyState>
      ) : (
        <NewCommissionForm shops={shops} onMade={(id) => void navigate(`/commissions/${id}`)} />
      )}
    </Page>
  );
}
