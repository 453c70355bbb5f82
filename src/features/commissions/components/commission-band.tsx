import { useSuspenseQuery } from '@tanstack/react-query';
import { RelayBand } from '../../../components/drawings/relay-band.tsx';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { handoffQueries } from '../../../lib/queries/handoffs.ts';
import { bandInputFrom } from '../band-input.ts';

/** The relay band for those who work on the piece. */
export function MakersBand({ commissionId, title }: { commissionId: string; title: string }) {
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { data: handoffs } = useSuspenseQuery(handoffQueries.list(commissionId));
  return <RelayBand label={title} input={bandInputFrom({ ...data, legs, handoffs })} />;
}

/** The same band from what a client may know alone. */
export function ClientsBand({ commissionId, title }: { commissionId: string; title: string }) {
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  return <RelayBand label={title} input={bandInputFrom(data)} />;
}
