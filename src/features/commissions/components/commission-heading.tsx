import { useSuspenseQuery } from '@tanstack/react-query';
import { standingFor } from '../../../../shared/engines/standing/standing.ts';
import { PageHeading } from '../../../components/ui/page.tsx';
import { commissionQueries } from '../../../lib/queries/commissions.ts';

/** Code, title and the merged status in one sentence: the same words for every reader. */
export function CommissionHeading({ commissionId, forClient }: { commissionId: string; forClient: boolean }) {
  const { data: commission } = useSuspenseQuery(commissionQueries.detail(commissionId));
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const standing = standingFor(data.facts, data.todayIso);
  return (
    <PageHeading
      stampedLine={
        <>
          {forClient ? 'Your piece' : 'Commission'} <span className="figures">{commission.code}</span>
          {!forClient && commission.clientName && <> · for {commission.clientName}</>}
          {commission.leadName && <> · lead {commission.leadName}</>}
        </>
      }
      title={commission.title}
      headline={<span data-testid="headline">{standing.headline}</span>}
    />
  );
}
