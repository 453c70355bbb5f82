import { useSuspenseQuery } from '@tanstack/react-query';
import { Sheet } from '../../components/ui/sheet.tsx';
import { EditCommissionForm } from '../../features/commissions/components/commission-form.tsx';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const { data: commission } = useSuspenseQuery(commissionQueries.detail(usePathId('commissionId')));
  return (
    <Sheet title="Brief and state">
      <EditCommissionForm commission={commission} />
    </Sheet>
  );
}
