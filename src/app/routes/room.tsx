import { useSuspenseQuery } from '@tanstack/react-query';
import { TwoColumns } from '../../components/ui/page.tsx';
import { ClientWindow } from '../../features/client-window/components/client-window.tsx';
import { ClientsBand } from '../../features/commissions/components/commission-band.tsx';
import {
  JointsAndReports,
  OpenHandoffs,
  OwnLegs,
  ToldToClient,
  WhoHasWhat,
} from '../../features/commissions/components/rooms.tsx';
import { StandingOnly } from '../../features/commissions/components/standing-only.tsx';
import { PictureWall } from '../../features/pictures/components/picture-wall.tsx';
import { ThreadSheet } from '../../features/threads/components/thread-sheet.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { threadQueries } from '../../lib/queries/threads.ts';
import { todayIn } from '../../lib/today.ts';
import { usePathId } from '../use-path-id.ts';

/** The thread that everyone reads stands in the room itself. */
function CommonThread({ commissionId }: { commissionId: string }) {
  const { data: threads } = useSuspenseQuery(threadQueries.list(commissionId));
  const common = threads.find((thread) => thread.subject === 'commission' && thread.audience === 'everyone');
  return common ? <ThreadSheet commissionId={commissionId} thread={common} /> : null;
}

export function Component() {
  const commissionId = usePathId('commissionId');
  const { isClient, memberships, roles } = useSight(commissionId);
  const today = todayIn();
  if (isClient)
    return (
      <ClientWindow
        commissionId={commissionId}
        band={<ClientsBand commissionId={commissionId} title="The way of your piece" />}
        thread={<CommonThread commissionId={commissionId} />}
        pictures={
          <PictureWall
            commissionId={commissionId}
            place="commission"
            placeId={commissionId}
            title="Pictures"
            purposes={[]}
          />
        }
      />
    );
  const looksOn = roles.has('guest') || memberships.every((membership) => membership.shopRole === 'bookkeeper');
  if (looksOn) return <StandingOnly commissionId={commissionId} mayStand={roles.has('guest')} />;
  return (
    <TwoColumns
      main={
        <div className="grid gap-5">
          <OwnLegs commissionId={commissionId} today={today} />
          <JointsAndReports commissionId={commissionId} />
          <CommonThread commissionId={commissionId} />
        </div>
      }
      side={
        <div className="grid gap-5">
          <OpenHandoffs commissionId={commissionId} />
          <WhoHasWhat commissionId={commissionId} />
          <ToldToClient commissionId={commissionId} />
        </div>
      }
    />
  );
}
