import { useSuspenseQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { RouteOutput } from '../../../../shared/contracts/route.ts';
import { markBenchSeen, type getBench, type MovedView } from '../../../../shared/contracts/standing.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Page, PageHeading, TwoColumns } from '../../../components/ui/page.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { keys } from '../../../lib/query-keys.ts';
import { benchQuery } from '../../../lib/queries/bench.ts';
import { meQuery } from '../../../lib/queries/me.ts';
import { shortInstant } from '../../../lib/today.ts';
import { COMMISSION_STATE_WORDS } from '../../../lib/words.ts';
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

type Bench = RouteOutput<typeof getBench>;

/** A client's pieces, each with the way to its window. */
function YourPieces({ pieces }: { pieces: Bench['yourPieces'] }) {
  return (
    <Sheet title="Your pieces">
      <ul>
        {pieces.map((piece) => (
          <li key={piece.commissionId} className="border-b border-hairline py-3 last:border-b-0">
            <p className="flex flex-wrap items-center gap-2">
              <Link
                to={`/commissions/${piece.commissionId}`}
                className="font-semibold underline decoration-hairline underline-offset-4"
              >
                {piece.title}
              </Link>
              <Stamp>{COMMISSION_STATE_WORDS[piece.state]}</Stamp>
            </p>
            <p className="text-note text-lead-grey">
              <span className="figures">{piece.code}</span> · with {piece.leadName}
            </p>
          </li>
        ))}
      </ul>
    </Sheet>
  );
}

function Unread({ threads }: { threads: Bench['unread'] }) {
  return (
    <Sheet id="unread" title="Unread">
      <ul>
        {threads.map((thread) => (
          <li key={thread.threadId} className="border-b border-hairline py-3 last:border-b-0">
            <Link
              to={`/commissions/${thread.commissionId}/threads/${thread.threadId}`}
              className="underline decoration-hairline underline-offset-4"
            >
              {thread.title}
            </Link>
            <p className="text-note text-lead-grey">
              {thread.commissionTitle} · {thread.messages} {thread.messages === 1 ? 'message' : 'messages'}
            </p>
          </li>
        ))}
      </ul>
    </Sheet>
  );
}

const handsWords = (count: number): string =>
  count === 0
    ? 'Nothing waits on your hands.'
    : count === 1
      ? 'One thing waits on your hands.'
      : `${count} things wait on your hands.`;

/** The reader's home: what waits on their hands, what they wait on, and what moved since they were last here. */
export function BenchPage({ today }: { today: string }) {
  const { data } = useSuspenseQuery(benchQuery());
  const seen = useAct(markBenchSeen, { stale: () => [keys.bench()], said: 'Marked as seen.' });
  const { data: me } = useSuspenseQuery(meQuery());
  const isClientOnly = data.roles.length > 0 && data.roles.every((role) => role === 'client' || role === 'guest');
  const isStewardOnly = data.roles.length === 0 && me.isSteward;
  const looksOnly = isClientOnly || isStewardOnly;
  return (
    <Page>
      <PageHeading title={isClientOnly ? 'My pieces' : 'My bench'} headline={handsWords(data.waitsOnYou.length)} />
      <TwoColumns
        main={
          <div className="grid gap-5">
            {isStewardOnly && (
              <Sheet title="This installation">
                <p>
                  You open shops and see{' '}
                  <Link to="/shops" className="underline">
                    all of them
                  </Link>
                  ; what is inside their commissions is theirs.
                </p>
              </Sheet>
            )}
            {(data.waitsOnYou.length > 0 || !looksOnly) && (
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
            )}
            {data.yourPieces.length > 0 && <YourPieces pieces={data.yourPieces} />}
            {!looksOnly && (
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
            )}
          </div>
        }
        side={
          <div className="grid gap-5">
            {data.unread.length > 0 && <Unread threads={data.unread} />}
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
                    <Button variant="outline" busy={seen.pending} onClick={() => seen.run({})}>
                      I have seen these
                    </Button>
                  </div>
                  <ProblemNotice problem={seen.problem} />
                </>
              )}
            </Sheet>
          </div>
        }
      />
    </Page>
  );
}
