import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { Door } from '../../features/account/components/door.tsx';
import { InvitationCard } from '../../features/account/components/invitation-card.tsx';
import { Notice } from '../../components/ui/notice.tsx';
import { getMe } from '../../../shared/contracts/accounts.ts';
import { api, isProblem } from '../../lib/api.ts';
import { useLinkToken } from '../use-link-token.ts';

export function Component() {
  const token = useLinkToken();
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  // Nobody being signed in is an answer here and no reason to leave for the sign-in page.
  const { data: me, isPending } = useQuery({
    queryKey: ['invited-person'],
    queryFn: ({ signal }) =>
      api(getMe, {}, { signal }).catch((error: unknown) => {
        if (isProblem(error, 'not-signed-in')) return null;
        throw error;
      }),
  });
  return (
    <Door title="An invitation">
      {!token && (
        <Notice tone="oxide" title="This link is not whole">
          Open it from the letter again, all of it.
        </Notice>
      )}
      {token && !isPending && (
        <InvitationCard
          token={token}
          signedInAs={me?.email ?? null}
          onJoined={(commissionId) => {
            queryClient.clear();
            void navigate(commissionId ? `/commissions/${commissionId}` : '/', { replace: true });
          }}
        />
      )}
    </Door>
  );
}
