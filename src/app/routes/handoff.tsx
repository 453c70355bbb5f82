import { useSuspenseQuery } from '@tanstack/react-query';
import { TwoColumns } from '../../components/ui/page.tsx';
import { HandoffSheet } from '../../features/handoffs/components/handoff-sheet.tsx';
import { handoffQueries } from '../../lib/queries/handoffs.ts';
import { todayIn } from '../../lib/today.ts';
import { SubjectThreads } from '../subject-threads.tsx';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const handoffId = usePathId('handoffId');
  const { data: handoff } = useSuspenseQuery(handoffQueries.detail(commissionId, handoffId));
  return (
    <TwoColumns
      main={<HandoffSheet commissionId={commissionId} handoffId={handoffId} today={todayIn()} />}
      side={
        <div className="grid gap-5">
          <SubjectThreads
            commissionId={commissionId}
            subject="handoff"
            subjectId={handoffId}
            title="About this handoff"
            partyIds={[handoff.fromPartyId, handoff.toPartyId]}
          />
        </div>
      }
    />
  );
}
