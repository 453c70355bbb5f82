import { Sheet } from '../../../components/ui/sheet.tsx';
import { ClientsBand } from './commission-band.tsx';

/** For those who look on: the way of the piece, and nothing to do. */
export function StandingOnly({ commissionId }: { commissionId: string }) {
  return (
    <Sheet title="The way so far">
      <ClientsBand commissionId={commissionId} title="The way of the piece" />
    </Sheet>
  );
}
