import { useSuspenseQuery } from '@tanstack/react-query';
import { mayDo } from '../../../shared/abilities/ability.ts';
import { TwoColumns } from '../../components/ui/page.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { LegActs, OpenHandoffs, WhoHasWhat } from '../../features/commissions/components/rooms.tsx';
import { LegsSheet } from '../../features/plan/components/legs-sheet.tsx';
import { HandoffForm, JointForm, LegForm, PartForm } from '../../features/plan/components/plan-forms.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { usePartyBook } from '../../hooks/use-party-names.ts';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { todayIn } from '../../lib/today.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const { ability, mine } = useSight(commissionId);
  const { parties } = usePartyBook(commissionId);
  const { data: parts } = useSuspenseQuery(commissionQueries.parts(commissionId));
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const today = todayIn();
  const shared = { commissionId, parties, parts, legs };
  const [own = ''] = mine;
  const isLead = mayDo(ability, 'create', 'Leg', { commissionId, partyId: own });
  const mayHandOver = mayDo(ability, 'create', 'Handoff', { commissionId, fromPartyId: own, toPartyId: '' });
  return (
    <TwoColumns
      main={
        <LegsSheet
          commissionId={commissionId}
          actsOf={(leg) => <LegActs commissionId={commissionId} leg={leg} today={today} />}
        />
      }
      side={
        <div className="grid gap-5">
          <WhoHasWhat commissionId={commissionId} />
          <OpenHandoffs commissionId={commissionId} />
          {isLead && (
            <Sheet title="Add a part">
              <PartForm {...shared} />
            </Sheet>
          )}
          {isLead && (
            <Sheet title="Add a leg">
              <LegForm key={parts.length} {...shared} />
            </Sheet>
          )}
          {isLead && (
            <Sheet title="Add a joint">
              <JointForm key={parts.length} {...shared} />
            </Sheet>
          )}
          {mayHandOver && (
            <Sheet title="Plan a handoff">
              <HandoffForm {...shared} />
            </Sheet>
          )}
        </div>
      }
    />
  );
}
