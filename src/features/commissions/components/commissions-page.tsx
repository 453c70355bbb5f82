import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { COMMISSION_STATES, type CommissionState } from '../../../../shared/contracts/vocabulary.ts';
import type { CommissionRow } from '../../../../shared/contracts/commissions.ts';
import { buttonClass } from '../../../components/ui/button-class.ts';
import { Button } from '../../../components/ui/button.tsx';
import { DataTable, type Column } from '../../../components/ui/data-table.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Page, PageHeading } from '../../../components/ui/page.tsx';
import { RelativeDay } from '../../../components/ui/relative-day.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { shortInstant, todayIn } from '../../../lib/today.ts';
import { COMMISSION_STATE_WORDS, ROLE_WORDS } from '../../../lib/words.ts';

const columnsFor = (today: string): Column<CommissionRow>[] => [
  {
    key: 'title',
    header: 'Piece',
    namesRow: true,
    cell: (row) => (
      <Link to={`/commissions/${row.id}`} className="font-semibold underline decoration-hairline underline-offset-4">
        {row.title}
      </Link>
    ),
  },
  { key: 'code', header: 'Code', cell: (row) => <span className="figures whitespace-nowrap">{row.code}</span> },
  {
    key: 'state',
    header: 'Where it stands',
    cell: (row) => (
      <span className="inline-flex flex-wrap gap-2">
        <Stamp tone={row.state === 'delivered' ? 'verdigris' : 'neutral'}>{COMMISSION_STATE_WORDS[row.state]}</Stamp>
        {row.heldLegs > 0 && (
          <Stamp tone="oxide">{row.heldLegs === 1 ? 'One leg held' : `${row.heldLegs} legs held`}</Stamp>
        )}
      </span>
    ),
  },
  { key: 'client', header: 'For', cell: (row) => row.clientName ?? 'no client yet' },
  { key: 'lead', header: 'Lead', cell: (row) => row.leadName },
  { key: 'you', header: 'You are', cell: (row) => row.yourRoles.map((role) => ROLE_WORDS[role]).join(', ') || 'Guest' },
  {
    key: 'wanted',
    header: 'Wanted',
    cell: (row) => (row.dateWanted ? <RelativeDay day={row.dateWanted} today={today} form="short" /> : 'no date'),
  },
  { key: 'moved', header: 'Last change', cell: (row) => shortInstant(row.updatedAt) },
];

const isState = (text: string | null): text is CommissionState =>
  (COMMISSION_STATES as readonly string[]).includes(text ?? '');

/** Every commission the reader has a part in; search and state live in the address. */
export function CommissionsPage({ mayOpen }: { mayOpen: boolean }) {
  const [params, setParams] = useSearchParams();
  const search = params.get('search') ?? '';
  const stateText = params.get('state');
  const filter = { ...(search ? { search } : {}), ...(isState(stateText) ? { state: stateText } : {}) };
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useSuspenseInfiniteQuery(
    commissionQueries.list(filter),
  );
  const rows = data.pages.flatMap((page) => page.items);
  const setState = (state: string): void =>
    setParams((before) => {
      const next = new URLSearchParams(before);
      if (state) next.set('state', state);
      else next.delete('state');
      return next;
    });
  return (
    <Page>
      <PageHeading
        title="Commissions"
        headline={search ? `Found for “${search}”` : undefined}
        actions={
          mayOpen ? (
            <Link to="/commissions/new" className={buttonClass('primary')}>
              Open a commission
            </Link>
          ) : undefined
        }
      />
      <div className="mb-4 max-w-60">
        <Field label="Where it stands">
          <Select value={stateText ?? ''} onChange={(event) => setState(event.target.value)}>
            <option value="">All</option>
            {COMMISSION_STATES.map((state) => (
              <option key={state} value={state}>
                {COMMISSION_STATE_WORDS[state]}
              </option>
            ))}
          </Select>
        </Field>
      </div>
      <DataTable
        caption="Commissions, latest change first"
        columns={columnsFor(todayIn())}
        rows={rows}
        rowKey={(row) => row.id}
        empty={
          <EmptyState title={search || stateText ? 'Nothing here matches' : 'No commissions yet'}>
            {search || stateText
              ? 'Try fewer words or another state.'
              : 'Pieces you lead, work on or ordered will be listed here. An invitation by e-mail brings you into one.'}
          </EmptyState>
        }
      />
      {hasNextPage && (
        <div className="mt-4">
          <Button variant="outline" busy={isFetchingNextPage} onClick={() => void fetchNextPage()}>
            Show more
          </Button>
        </div>
      )}
    </Page>
  );
}
