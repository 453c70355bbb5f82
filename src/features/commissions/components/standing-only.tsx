import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { ClientsBand } from './commission-band.tsx';

/** For those who look on: the way of the piece, and nothing to do. */
export function StandingOnly({ commissionId, mayStand }: { commissionId: string; mayStand: boolean }) {
  return (
    <Sheet title="The way so far">
      {mayStand ? (
        <ClientsBand commissionId={commissionId} title="The way of the piece" />
      ) : (
        <EmptyState title="Nothing for you in this room">
          Your part in this commission is its money; the legs are under Plan.
        </EmptyState>
      )}
    </Sheet>
  );
}
