import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { Button } from '../../components/ui/button.tsx';
import { EmptyState } from '../../components/ui/empty-state.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { commissionQueries } from '../../lib/queries/commissions.ts';
import { shortInstant } from '../../lib/today.ts';
import { usePathId } from '../use-path-id.ts';

export function Component() {
  const commissionId = usePathId('commissionId');
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useSuspenseInfiniteQuery(
    commissionQueries.history(commissionId),
  );
  const lines = data.pages.flatMap((page) => page.items);
  return (
    <Sheet title="What happened" note="Newest first, as far as it is yours to see">
      {lines.length === 0 ? (
        <EmptyState title="Nothing yet">Every start, agreement and handover will be written here.</EmptyState>
      ) : (
        <ol>
          {lines.map((line) => (
            <li key={line.id} className="border-b border-hairline py-2 last:border-b-0">
              {line.words}{' '}
              <span className="text-note text-lead-grey">
                · {line.by}, {shortInstant(line.at)}
              </span>
            </li>
          ))}
        </ol>
      )}
      {hasNextPage && (
        <div className="pt-4">
          <Button variant="outline" busy={isFetchingNextPage} onClick={() => void fetchNextPage()}>
            Show earlier
          </Button>
        </div>
      )}
    </Sheet>
  );
}
