import { useQueryErrorResetBoundary } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link } from 'react-router-dom';
import { buttonClass } from '../components/ui/button-class.ts';
import { Page, PageHeading } from '../components/ui/page.tsx';
import { Sheet } from '../components/ui/sheet.tsx';
import { isProblem } from '../lib/api.ts';

interface RouteProblemProps {
  error: unknown;
}

const isMissing = (error: unknown): boolean => isProblem(error, 'not-found') || isProblem(error, 'not-permitted');

const titleOf = (error: unknown): string =>
  isMissing(error) ? 'There is nothing here for you' : 'This page could not be shown';

const wordsOf = (error: unknown): string =>
  isMissing(error)
    ? 'It may have been taken away, or your part in it has ended. Ask the lead if you expected to find something.'
    : isProblem(error)
      ? error.message
      : 'What you wrote is kept on this device. Load the page again; if that does not help, tell your steward.';

function WaysOut({ error }: RouteProblemProps) {
  const { reset } = useQueryErrorResetBoundary();
  // Whoever comes back asks anew and does not get the old answer.
  useEffect(reset, [reset]);
  return (
    <p className="flex flex-wrap gap-2">
      <Link to="/" className={buttonClass('outline')}>
        To the bench
      </Link>
      {!isMissing(error) && (
        <button type="button" className={buttonClass('quiet')} onClick={() => location.reload()}>
          Load again
        </button>
      )}
    </p>
  );
}

/** What a page says when it could not be shown. Drafts are on the device and not lost with it. */
export function PageProblem({ error }: RouteProblemProps) {
  return (
    <Page>
      <PageHeading title={titleOf(error)} headline={wordsOf(error)} />
      <WaysOut error={error} />
    </Page>
  );
}

/** The same for a room, inside the page of its commission. */
export function RoomProblem({ error }: RouteProblemProps) {
  return (
    <Sheet title={titleOf(error)}>
      <p className="max-w-words pb-4">{wordsOf(error)}</p>
      <WaysOut error={error} />
    </Sheet>
  );
}
