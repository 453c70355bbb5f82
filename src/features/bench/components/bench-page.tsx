import { useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { markBenchSeen, type MovedView } from '../../../../shared/contracts/standing.ts';
import { Button } from '../../../components/ui/button.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Page, PageHeading, TwoColumns } from '../../../components/ui/page.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { api } from '../../../lib/api.ts';
import { keys } from '../../../lib/query-keys.ts';
import { benchQuery } from '../../../lib/queries/commissions.ts';
import { shortInstant } from '../../../lib/today.ts';
import { addressOfSubject } from '../subject-address.ts';
import { BenchRow } from './bench-row.tsx';

function Moved({ line }: { line: MovedView }) {
  return (
    <li className="border-b border-hairline py-3 last:border-b-0">
      <Link
        to={addressOfSubject(line.commissionId, line.subject, line.subjectId)}
        className="underline decoration-hairline underline-offset-4"
      >
        {line.words}
      </Link>
      <p className="text-note text-lead-grey">
        {line.commissionTitle} · {line.by}, {shortInstant(line.at)}
      </p>
    </li>
  );
}

/** The reader's home: what waits on their hands, what they wait on, and what moved since they were last here. */
export function BenchPage({ today }: { today: string }) {
  const queryClient = useQueryClient();
  const { data } = useSuspenseQuery(benchQuery());
  const seen = useMutation({
    mutationFn: () => api(markBenchSeen, {}),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: keys.bench() }),
  });
  const isClientOnly = data.roles.length > 0 && data.roles.every((role) => role === 'client');
  const name = data.roles.includes('lead') ? 'My desk' : isClientOnly ? 'Your pieces' : 'My bench';
  return (
    <Page>
      <PageHeading
        title={name}
        headline={
          data.waitsOnYou.length === 0
            ? 'Nothing waits on your hands.'
            : data.waitsOnYou.length === 1
              ? 'One thing waits on your hands.'
              : `${data.waitsOnYou.length} things wait on your hands.`
        }
      />
      <TwoColumns
        main={
          <div className="grid gap-5">
            <Sheet title="Waits on you" note="What holds up most comes first">
              {data.waitsOnYou.length === 0 ? (
                <EmptyState title="Your hands are free">
                  Reports to answer, days to agree and legs to start will stand here.
                </EmptyState>
              ) : (
                <ul aria-label="Waits on you">
                  {data.waitsOnYou.map((item) => (
                    <BenchRow key={item.kind + item.refId} item={item} today={today} mine />
                  ))}
                </ul>
              )}
            </Sheet>
            <Sheet title="You wait on">
              {data.youWaitOn.length === 0 ? (
                <EmptyState title="You wait on nobody">
                  What others owe the pieces you work on will stand here.
                </EmptyState>
              ) : (
                <ul aria-label="You wait on">
                  {data.youWaitOn.map((item) => (
                    <BenchRow key={item.kind + item.refId} item={item} today={today} mine={false} />
                  ))}
                </ul>
              )}
            </Sheet>
          </div>
        }
        side={
          <Sheet
            title="Moved since you were last here"
            note={data.lastHereAt ? `since ${shortInstant(data.lastHereAt)}` : 'in the last 30 days'}
          >
            {data.moved.length === 0 ? (
              <EmptyState title="Nothing moved">What others do on your pieces will be listed here.</EmptyState>
            ) : (
              <>
                <ul>
                  {data.moved.map((line) => (
                    <Moved key={line.id} line={line} />
                  ))}
                </ul>
                <div className="mt-4">
                  <Button variant="outline" busy={seen.isPending} onClick={() => seen.mutate()}>
                    I have seen these
                  </Button>
                </div>
              </>
            )}
          </Sheet>
        }
      />
    </Page>
  );
}
