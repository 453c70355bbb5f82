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
import { LegsSheet } from '../../features/plan/components/legs-sheet.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { usePartyBook } from '../../hooks/use-party-names.ts';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { threadQueries } from '../../lib/queries/threads.ts';
import { todayIn } from '../../lib/today.ts';
import { usePathId } from '../use-path-id.ts';

/** The thread that everyone reads stands in the room itself. */
function CommonThread({ commissionId }: { commissionId: string }) {
  const { data: threads } = useSuspenseQuery(threadQueries.list(commissionId));
  const common = threads.find((thread) => thread.subject === 'commission' && thread.audience === 'everyone');
  return common ? <ThreadSheet commissionId={commissionId} thread={common} /> : null;
}

/** For those who keep a shop's books: the way of the piece and its plan. */
function BooksRoom({ commissionId }: { commissionId: string }) {
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { parties } = usePartyBook(commissionId);
  return (
    <div className="grid gap-5">
      <StandingOnly commissionId={commissionId} />
      <LegsSheet choices={{ commissionId, parties, parts: [], legs }} actsOf={() => null} />
    </div>
  );
}

export function Component() {
  const commissionId = usePathId('commissionId');
  const { isClient, roles } = useSight(commissionId);
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
  if (roles.size === 0) return <BooksRoom commissionId={commissionId} />;
  if (roles.has('guest')) return <StandingOnly commissionId={commissionId} />;
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
