import { Link, useRouteError } from 'react-router-dom';
import { buttonClass } from '../components/ui/button-class.ts';
import { Page, PageHeading } from '../components/ui/page.tsx';
import { isProblem } from '../lib/api.ts';

/** What a page says when it could not be shown. Drafts are on the device and not lost with it. */
export function RouteProblem() {
  const error = useRouteError();
  const missing = isProblem(error, 'not-found') || isProblem(error, 'not-permitted');
  return (
    <Page>
      <PageHeading
        title={missing ? 'There is nothing here for you' : 'This page could not be shown'}
        headline={
          missing
            ? 'It may have been taken away, or your part in it has ended. Ask the lead if you expected to find something.'
            : isProblem(error)
              ? error.message
              : 'What you wrote is kept on this device. Load the page again; if that does not help, tell your steward.'
        }
      />
      <p className="flex flex-wrap gap-2">
        <Link to="/" className={buttonClass('outline')}>
          To the bench
        </Link>
        {!missing && (
          <button type="button" className={buttonClass('quiet')} onClick={() => location.reload()}>
            Load again
          </button>
        )}
      </p>
    </Page>
  );
}
