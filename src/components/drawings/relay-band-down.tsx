import { useId } from 'react';
import type { BandModel, BandStep } from '../../../shared/engines/band/band-types.ts';
import { joinClasses } from '../ui/join-classes.ts';
import { Bead, RingShape, SawCut } from './band-shapes.tsx';
import type { RingTints } from './band-shapes.tsx';
import { lanesOf } from './band-lanes.ts';
import type { LaneCell } from './band-lanes.ts';

export interface BandDownProps {
  model: BandModel;
  tintsOf?: ((handoffId: string) => RingTints | null) | undefined;
}

const WORDS_TONE: Record<BandStep['state'], string> = {
  done: 'text-lead-grey',
  now: 'text-brass',
  held: 'text-oxide',
  next: 'text-lead-grey',
};

/** The band from top to bottom, one step under the other; tubes are longer where the work is. It reads as a list. */
export function RelayBandDown({ model, tintsOf }: BandDownProps) {
  const steps = lanesOf(model);
  const manyParts = model.rows.length > 1;
  return (
    <ol className="flex flex-col">
      {steps.map(({ step, size, cells }) => (
        <li key={`${step.kind} ${step.id}`} className={joinClasses('flex items-stretch gap-4', SIZES[size])}>
          <span aria-hidden className="flex flex-none">
            {cells.map((cell, lane) => (
              <Lane key={lane} cell={cell} main={lane === 0} tints={tintsOf?.(step.id)} />
            ))}
          </span>
          <span className="flex min-w-0 flex-1 flex-col justify-center py-2">
            {manyParts && step.partName && <span className="text-lead-grey stamped">{step.partName}</span>}
            <span
              className={joinClasses('first-letter:uppercase', step.kind === 'handoff' ? 'text-note' : 'font-semibold')}
            >
              {step.title}
              {step.here && <span className="sr-only"> (here now)</span>}
            </span>
            <span
              className={joinClasses('text-note', step.kind === 'expected' ? 'text-gun-blue' : WORDS_TONE[step.state])}
            >
              {step.words}
            </span>
          </span>
        </li>
      ))}
    </ol>
  );
}

const SIZES = { ring: 'min-h-10', short: 'min-h-16', middle: 'min-h-24', long: 'min-h-32' };

const METAL = {
  finished:
    'border border-done-edge [background-image:linear-gradient(to_right,var(--done-body),var(--done-lit)_36%,var(--done-body)_62%,var(--done-shade))]',
  'under-way':
    'border border-work-edge [background-image:linear-gradient(to_right,var(--work-body),var(--work-lit)_36%,var(--work-body)_62%,var(--work-shade))]',
  planned: 'border border-dashed border-lead-grey bg-vellum',
};

/** One lane of one step: a tube, a ring, a rod that goes on, or nothing. */
function Lane({ cell, main, tints }: { cell: LaneCell; main: boolean; tints: RingTints | null | undefined }) {
  const width = main ? 'w-12' : 'w-7';
  const rod = (shown: boolean) => <span className={joinClasses('w-0.5 flex-1', shown && 'bg-lead-grey')} />;
  if (cell.kind === 'tube')
    return (
      <span className={joinClasses('relative flex flex-col items-center', width)}>
        <span className={joinClasses('h-1 w-0.5', cell.before && 'bg-lead-grey')} />
        <span
          className={joinClasses(
            'flex-1 rounded print:[print-color-adjust:exact]',
            main ? 'w-7.5' : 'w-4',
            METAL[cell.state],
          )}
        />
        <span className={joinClasses('h-1 w-0.5', (cell.after || cell.joins > 0) && 'bg-lead-grey')} />
        {(cell.here || cell.held) && (
          <svg
            viewBox="-24 -28 48 56"
            className="absolute top-1/2 left-1/2 h-14 w-12 -translate-x-1/2 -translate-y-1/2 overflow-visible"
          >
            {cell.held && (
              <g transform="rotate(90)">
                <SawCut x={8} axisY={0} halfPx={main ? 15 : 8} />
              </g>
            )}
            {cell.here && <Bead x={0} y={cell.held ? -14 : 0} r={main ? 9 : 6} />}
          </svg>
        )}
        {cell.joins > 0 && <JoinLine lanes={cell.joins} />}
      </span>
    );
  if (cell.kind === 'ring')
    return (
      <span className={joinClasses('relative flex flex-col items-center', width)}>
        {rod(cell.before)}
        <svg viewBox="-24 -7 48 14" className="h-3.5 w-12 flex-none overflow-visible">
          <g transform="rotate(90)">
            <RingShape x={0} y={0} rx={6} ry={main ? 22 : 12} state={cell.state} tints={tints} />
          </g>
        </svg>
        {rod(cell.after || cell.joins > 0)}
        {cell.joins > 0 && <JoinLine lanes={cell.joins} />}
      </span>
    );
  if (cell.kind === 'fade') return <Fade width={width} />;
  return <span className={joinClasses('flex flex-col items-center', width)}>{rod(cell.kind === 'rod')}</span>;
}

/** From the foot of a lane towards the lane that the part goes into; lanes are 28 px wide, the first 48 px. */
function JoinLine({ lanes }: { lanes: number }) {
  const towards = lanes * 28 - 14 + 24;
  return (
    <svg viewBox="0 0 1 12" className="absolute -bottom-3 left-1/2 h-3 w-px overflow-visible">
      <path d={`M0.5 0Q0.5 8 -8 8H${-towards}`} className="fill-none stroke-lead-grey" strokeWidth="2" />
    </svg>
  );
}

function Fade({ width }: { width: string }) {
  const id = useId();
  return (
    <span className={joinClasses('flex flex-col items-center', width)}>
      <svg viewBox="0 0 30 64" preserveAspectRatio="none" className="h-full w-7.5">
        <linearGradient id={id} x1="0" y1="0" x2="0" y2="1">
          <stop offset="0" className="[stop-color:var(--gun-blue)]" stopOpacity="0.08" />
          <stop offset="0.45" className="[stop-color:var(--gun-blue)]" stopOpacity="0.5" />
          <stop offset="1" className="[stop-color:var(--gun-blue)]" stopOpacity="0" />
        </linearGradient>
        <rect width="30" height="64" fill={`url(#${id})`} />
      </svg>
    </span>
  );
}
