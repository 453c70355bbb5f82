import { useSuspenseQuery } from '@tanstack/react-query';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { RelayBand } from '../../../components/drawings/relay-band.tsx';
import type { RingTints } from '../../../components/drawings/band-shapes.tsx';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { handoffQueries } from '../../../lib/queries/handoffs.ts';
import { bandInputFrom } from '../band-input.ts';

const NoWayYet = () => (
  <EmptyState title="No work is planned yet">
    The way of the piece will stand here, from its first leg to delivery.
  </EmptyState>
);

/** The relay band for those who work on the piece; the two halves of a ring are in the tints of the two shops. */
export function MakersBand({ commissionId, title }: { commissionId: string; title: string }) {
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  const { data: legs } = useSuspenseQuery(commissionQueries.legs(commissionId));
  const { data: handoffs } = useSuspenseQuery(handoffQueries.list(commissionId));
  const { parties } = usePartyBook(commissionId);
  const tintsOf = (handoffId: string): RingTints | null => {
    const handoff = handoffs.find((one) => one.id === handoffId);
    const tintOf = (partyId: string | undefined) => parties.find((party) => party.id === partyId)?.tint;
    const [from, to] = [tintOf(handoff?.fromPartyId), tintOf(handoff?.toPartyId)];
    return from && to ? { from, to } : null;
  };
  if (legs.length === 0) return <NoWayYet />;
  return <RelayBand label={title} input={bandInputFrom({ ...data, legs, handoffs })} tintsOf={tintsOf} />;
}

/** The same band from what a client may know alone. */
export function ClientsBand({ commissionId, title }: { commissionId: string; title: string }) {
  const { data } = useSuspenseQuery(commissionQueries.standing(commissionId));
  if (data.facts.legs.length === 0) return <NoWayYet />;
  return <RelayBand label={title} input={bandInputFrom(data)} />;
}
