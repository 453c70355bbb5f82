import type { JointView, ReadingView } from '../../../../shared/contracts/joints.ts';
import { formatLength, type LengthUnit } from '../../../../shared/units/length.ts';
import { DataTable, type Column } from '../../../components/ui/data-table.tsx';
import { EmptyState } from '../../../components/ui/empty-state.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { shortInstant } from '../../../lib/today.ts';
import { SIDE_WORDS } from '../../../lib/words.ts';

/** A set stays together in the order in which it was taken. */
const newestSetsFirst = (readings: readonly ReadingView[]): ReadingView[] =>
  [...readings].sort((one, other) => other.takenAt.localeCompare(one.takenAt) || other.setNumber - one.setNumber);

/** Every reading as it was taken, with what was typed. */
export function ReadingsTable({
  joint,
  readings,
  unit,
}: {
  joint: JointView;
  readings: readonly ReadingView[];
  unit: LengthUnit;
}) {
  const names = SIDE_WORDS[joint.kind];
  const columns: Column<ReadingView>[] = [
    { key: 'side', header: 'Part', cell: (row) => names[row.side], namesRow: true },
    { key: 'set', header: 'Set', align: 'right', cell: (row) => row.setNumber },
    {
      key: 'value',
      header: 'Diameter',
      align: 'right',
      cell: (row) => (
        <span className="figures" title={`typed: ${row.enteredText}`}>
          {formatLength(row.valueMm, unit)}
        </span>
      ),
    },
    { key: 'typed', header: 'Typed', cell: (row) => <span className="figures">{row.enteredText}</span> },
    { key: 'gauge', header: 'Gauge', cell: (row) => `${row.gauge ?? 'not said'}, ${row.resolutionUm} µm` },
    {
      key: 'air',
      header: 'Air',
      cell: (row) =>
        [
          row.temperatureC === null ? '' : `${row.temperatureC} °C`,
          row.humidityPct === null ? '' : `${row.humidityPct} %`,
        ]
          .filter(Boolean)
          .join(', ') || 'not said',
    },
    { key: 'by', header: 'Taken', cell: (row) => `${row.takenBy}, ${shortInstant(row.takenAt)}` },
  ];
  return (
    <Sheet title="Readings" note="Never changed or taken away; a newer set takes over">
      <DataTable
        caption="Readings of this joint"
        columns={columns}
        rows={newestSetsFirst(readings)}
        rowKey={(row) => row.id}
        empty={
          <EmptyState title="Nothing measured yet">
            Readings of both parts will be listed with gauge, air and who took them.
          </EmptyState>
        }
      />
    </Sheet>
  );
}
