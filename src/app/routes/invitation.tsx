import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { Door } from '../../features/account/components/door.tsx';
import { InvitationCard } from '../../features/account/components/invitation-card.tsx';
import { Button } from '../../components/ui/button.tsx';
import { Notice } from '../../components/ui/notice.tsx';
import { Skeleton } from '../../components/ui/skeleton.tsx';
import { getMe, signOut } from '../../../shared/contracts/accounts.ts';
import { useAct } from '../../hooks/use-act.ts';
import { api, isProblem } from '../../lib/api.ts';
import { useInvitationToken } from '../use-link-token.ts';

const PERSON = ['invited-person'] as const;

export function Component() {
  const { token, forget } = useInvitationToken();
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  // Nobody being signed in is an answer here and no reason to leave for the sign-in page.
  const person = useQuery({
    queryKey: PERSON,
    queryFn: ({ signal }) =>
      api(getMe, {}, { signal }).catch((error: unknown) => {
        if (isProblem(error, 'not-signed-in')) return null;
        throw error;
      }),
  });
  const leave = useAct(signOut, { stale: () => [PERSON] });
  return (
    <Door title="An invitation">
      {!token && (
        <Notice tone="oxide" title="This link is not whole">
          Open it from the letter again, all of it.
        </Notice>
      )}
      {token && person.isPending && <Skeleton label="Reading the invitation" lines={3} />}
      {token && person.isError && (
        <Notice
          kind="alert"
          title="Ferrule could not be asked who you are"
          actions={
            <Button variant="outline" onClick={() => void person.refetch()}>
              Try again
            </Button>
          }
        >
          The invitation stays good.
        </Notice>
      )}
      {token && person.isSuccess && (
        <InvitationCard
          token={token}
          signedInAs={person.data?.email ?? null}
          leaving={leave.pending}
          onLeave={() => leave.run({})}
          onJoined={(commissionId) => {
            forget();
            queryClient.clear();
            void navigate(commissionId ? `/commissions/${commissionId}` : '/', { replace: true });
          }}
        />
      )}
    </Door>
  );
}
