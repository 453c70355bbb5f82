import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

export interface Column<Row> {
  key: string;
  header: ReactNode;
  cell: (row: Row) => ReactNode;
  /** Figures stand at the right. */
  align?: 'left' | 'right';
  /** Names the row for readers; one column per table. */
  namesRow?: boolean;
  sortable?: boolean;
  className?: string;
}

export interface SortOrder {
  key: string;
  direction: 'ascending' | 'descending';
}

export interface DataTableProps<Row> {
  /** Says what the table holds; shown only when `captionShown`. */
  caption: ReactNode;
  captionShown?: boolean;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  sort?: SortOrder;
  onSort?: (next: SortOrder) => void;
  /** Shown in place of the table when there are no rows; an `EmptyState`. */
  empty?: ReactNode;
}

/**
 * A table where there is room, and a stack of labelled rows where there is not (below 28 rem of its own container).
 * Roles are written out because browsers drop a table's own when its parts are displayed as blocks.
 */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const { caption, captionShown = false, columns, rows, rowKey, sort, onSort, empty } = props;
  if (rows.length === 0 && empty) return <>{empty}</>;
  return (
    <div className="@container min-w-0">
      <table role="table" className="block w-full border-collapse @md:table">
        <caption
          className={captionShown ? 'block pb-1.5 text-left text-lead-grey stamped @md:table-caption' : 'sr-only'}
        >
          {caption}
        </caption>
        <thead role="rowgroup" className="sr-only @md:not-sr-only @md:sticky @md:top-0 @md:z-10 @md:bg-vellum">
          <tr role="row">
            {columns.map((column) => (
              <th
                key={column.key}
                role="columnheader"
                scope="col"
                aria-sort={column.sortable ? (sort?.key === column.key ? sort.direction : 'none') : undefined}
                className={joinClasses(
                  'border-b border-edge px-2 align-middle font-normal text-lead-grey stamped',
                  column.align === 'right' ? 'text-right' : 'text-left',
                  column.sortable ? 'py-0' : 'py-1.5',
                )}
              >
                {column.sortable && onSort ? <SortButton column={column} sort={sort} onSort={onSort} /> : column.header}
              </th>
            ))}
          </tr>
        </thead>
        <tbody role="rowgroup" className="block @md:table-row-group">
          {rows.map((row) => (
            <tr
              key={rowKey(row)}
              role="row"
              className="block border-b border-hairline py-2 first:border-t @md:table-row @md:py-0 @md:first:border-t-0"
            >
              {columns.map((column) => (
                <BodyCell key={column.key} column={column} row={row} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function BodyCell<Row>({ column, row }: { column: Column<Row>; row: Row }) {
  const Cell = column.namesRow ? 'th' : 'td';
  return (
    <Cell
      role={column.namesRow ? 'rowheader' : 'cell'}
      scope={column.namesRow ? 'row' : undefined}
      className={joinClasses(
        'flex items-baseline gap-3 px-2 py-1 text-left @md:table-cell @md:py-2 @md:align-baseline',
        column.align === 'right' && '@md:text-right',
        column.namesRow ? 'font-semibold' : 'font-normal',
        column.className,
      )}
    >
      {!column.namesRow && (
        <span aria-hidden className="w-28 flex-none text-lead-grey stamped @md:hidden">
          {column.header}
        </span>
      )}
      <span className="min-w-0">{column.cell(row)}</span>
    </Cell>
  );
}

interface SortButtonProps<Row> {
  column: Column<Row>;
  sort: SortOrder | undefined;
  onSort: (next: SortOrder) => void;
}

function SortButton<Row>({ column, sort, onSort }: SortButtonProps<Row>) {
  const current = sort?.key === column.key ? sort.direction : null;
  const next = current === 'ascending' ? 'descending' : 'ascending';
  return (
    <button
      type="button"
      onClick={() => onSort({ key: column.key, direction: next })}
      className="inline-flex min-h-thumb items-center gap-1.5 stamped hover:text-soot"
    >
      {column.header}
      <svg aria-hidden viewBox="0 0 10 14" className="h-3.5 w-2.5 fill-current">
        <path d="M5 1 9 6H1Z" className={current === 'ascending' ? '' : 'opacity-30'} />
        <path d="M5 13 1 8h8Z" className={current === 'descending' ? '' : 'opacity-30'} />
      </svg>
    </button>
  );
}
