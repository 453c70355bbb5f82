import { useSuspenseQuery } from '@tanstack/react-query';
import { mayDo } from '../../../shared/abilities/ability.ts';
import { Sheet } from '../../components/ui/sheet.tsx';
import { EditCommissionForm } from '../../features/commissions/components/commission-form.tsx';
import { useSight } from '../../hooks/use-membership.ts';
import { ownProblem } from '../../lib/api.ts';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const { data: commission } = useSuspenseQuery(commissionQueries.detail(commissionId));
  const { ability } = useSight(commissionId);
  if (!mayDo(ability, 'update', 'Commission', { id: commissionId, memberKeys: [] }))
    throw ownProblem('not-permitted', 'The lead changes brief and state.');
  return (
    <Sheet title="Brief and state">
      <EditCommissionForm commission={commission} />
    </Sheet>
  );
}
