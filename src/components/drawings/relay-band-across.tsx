import { useId } from 'react';
import type { BandCollar, BandLabel, BandModel, BandRow } from '../../../shared/engines/band/band-types.ts';
import { BAND_TEXT_PX, bandGeometry, LANE_PX } from './band-geometry.ts';
import type { BandGeometry, RowGeometry } from './band-geometry.ts';
import { Bead, MetalGradients, RingShape, SawCut, TubeShape } from './band-shapes.tsx';
import type { RingTints } from './band-shapes.tsx';
import { shortenToWidth } from './text-width.ts';

export interface BandAcrossProps {
  model: BandModel;
  widthPx: number;
  gutterPx: number;
  tintsOf?: ((handoffId: string) => RingTints | null) | undefined;
}

/** The band from left to right, to the scale of time. It is hidden from readers, who get the steps as a list. */
export function RelayBandAcross({ model, widthPx, gutterPx, tintsOf }: BandAcrossProps) {
  const id = useId();
  const geometry = bandGeometry(model, widthPx, gutterPx);
  const { xOf, rows, ticksY, heightPx } = geometry;
  const todayX = xOf(model.todayX);
  return (
    <svg
      aria-hidden
      width={widthPx}
      height={heightPx}
      viewBox={`0 0 ${widthPx} ${heightPx}`}
      className="block h-auto max-w-full font-sans"
    >
      <defs>
        <MetalGradients id={id} />
      </defs>
      {model.ticks.map((tick) => (
        <g key={tick.x}>
          <line x1={xOf(tick.x)} x2={xOf(tick.x)} y1={28} y2={ticksY} className="stroke-hairline" />
          <text x={xOf(tick.x)} y={ticksY + 18} textAnchor="middle" fontSize="12" className="fill-lead-grey font-mono">
            {tick.words}
          </text>
        </g>
      ))}
      <line
        x1={todayX}
        x2={todayX}
        y1={24}
        y2={ticksY}
        className="stroke-soot"
        strokeDasharray="1.5 3"
        strokeWidth="1.5"
      />
      {model.collars.map((collar) => (
        <Joining
          key={`${collar.fromRow} ${collar.toRow} ${collar.x}`}
          collar={collar}
          model={model}
          geometry={geometry}
        />
      ))}
      {model.rows.map((row, at) => (
        <RowDrawing
          key={row.partId}
          row={row}
          place={rows[at]!}
          model={model}
          xOf={xOf}
          gradientId={id}
          tintsOf={tintsOf}
        />
      ))}
      {model.rows.map((row, at) => (
        <RowWords key={row.partId} row={row} place={rows[at]!} geometry={geometry} />
      ))}
      <text
        x={Math.min(Math.max(todayX, gutterPx + 30), widthPx - 36)}
        y={16}
        textAnchor="middle"
        fontSize={BAND_TEXT_PX}
        className="fill-soot font-semibold"
      >
        {model.todayWords}
      </text>
    </svg>
  );
}

interface RowDrawingProps {
  row: BandRow;
  place: RowGeometry;
  model: BandModel;
  xOf: BandGeometry['xOf'];
  gradientId: string;
  tintsOf: BandAcrossProps['tintsOf'];
}

function RowDrawing({ row, place: { axisY, halfPx }, model, xOf, gradientId, tintsOf }: RowDrawingProps) {
  const fades = model.fade && row.labels.some((label) => label.tone === 'expected') ? model.fade : null;
  const cuts = row.tubes.map((tube) => tube.cutX).filter((cutX) => cutX !== null);
  return (
    <g>
      {row.rods.map((rod) => (
        <line
          key={rod.x0}
          x1={xOf(rod.x0)}
          x2={xOf(rod.x1)}
          y1={axisY}
          y2={axisY}
          className="stroke-lead-grey"
          strokeWidth="2"
          strokeDasharray={rod.certain ? undefined : '4 3'}
        />
      ))}
      {fades && (
        <rect
          x={xOf(fades.x0)}
          y={axisY - halfPx}
          width={Math.max(8, xOf(fades.x1) - xOf(fades.x0))}
          height={halfPx * 2}
          fill={`url(#${gradientId}-likely)`}
        />
      )}
      {row.tubes.map((tube) => (
        <TubeShape
          key={tube.legId}
          x0={xOf(tube.x0)}
          x1={xOf(tube.x1)}
          axisY={axisY}
          halfPx={halfPx}
          state={tube.state}
          gradientId={gradientId}
        />
      ))}
      {row.rings.map((ring) => (
        <g key={ring.handoffId}>
          <title>{ring.words}</title>
          <RingShape
            x={xOf(ring.x)}
            y={axisY}
            rx={halfPx / 3 + 1.5}
            ry={halfPx + 7}
            state={ring.state}
            tints={tintsOf?.(ring.handoffId)}
          />
        </g>
      ))}
      {cuts.map((cutX) => (
        <SawCut key={cutX} x={xOf(cutX)} axisY={axisY} halfPx={halfPx} />
      ))}
      {row.beadX !== null && <Bead x={beadAside(xOf(row.beadX), cuts.map(xOf))} y={axisY} r={halfPx * 0.62} />}
    </g>
  );
}

/** Beside the cut rather than on it: the part waits before what holds it. */
function beadAside(x: number, cutsX: readonly number[]): number {
  const near = cutsX.find((cutX) => Math.abs(cutX - x) < 22);
  return near === undefined ? x : near - 22;
}

/** A part that goes into another: a rod that bends towards it and ends in a collar on its tube. */
function Joining({
  collar,
  model,
  geometry: { xOf, rows },
}: {
  collar: BandCollar;
  model: BandModel;
  geometry: BandGeometry;
}) {
  const from = rows[collar.fromRow];
  const to = rows[collar.toRow];
  if (!from || !to) return null;
  const x = xOf(collar.x);
  const leavesX = xOf(Math.max(0, ...(model.rows[collar.fromRow]?.tubes ?? []).map((tube) => tube.x1)));
  const up = to.axisY < from.axisY;
  const edgeY = up ? to.axisY + to.halfPx : to.axisY - to.halfPx;
  const bend = Math.min(12, Math.max(0, x - leavesX));
  const turnY = up ? from.axisY - bend : from.axisY + bend;
  return (
    <g className={collar.done ? 'stroke-verdigris' : 'stroke-lead-grey'}>
      <path
        d={`M${Math.min(leavesX, x)} ${from.axisY}H${x - bend}Q${x} ${from.axisY} ${x} ${turnY}V${edgeY}`}
        fill="none"
        strokeWidth={collar.done ? 4 : 2}
        strokeDasharray={collar.done ? undefined : '4 3'}
      />
      <rect
        x={x - 8}
        y={up ? edgeY : edgeY - 8}
        width="16"
        height="8"
        rx="1"
        className={collar.done ? 'fill-brass stroke-soot' : 'fill-vellum stroke-lead-grey'}
        strokeWidth="1.25"
      />
    </g>
  );
}

const LABEL_TONES: Record<BandLabel['tone'], string> = {
  plain: 'fill-soot',
  held: 'fill-oxide',
  expected: 'fill-gun-blue',
};

function RowWords({
  row,
  place,
  geometry: { xOf, gutterPx },
}: {
  row: BandRow;
  place: RowGeometry;
  geometry: BandGeometry;
}) {
  const footOf = (label: BandLabel) => place.labelFootY - label.lane * LANE_PX;
  const cuts = row.tubes.map((tube) => tube.cutX).filter((cutX) => cutX !== null);
  return (
    <g fontSize={BAND_TEXT_PX}>
      <text x={0} y={place.axisY + 4} className="fill-soot font-semibold stamped">
        {shortenToWidth(row.name, gutterPx - 12, 18.5)}
      </text>
      {row.labels
        .filter((label) => label.tone === 'held')
        .map((label, at) => {
          const x = xOf(cuts[at] ?? label.x);
          return (
            <line
              key={label.full}
              x1={x}
              x2={x}
              y1={place.axisY - place.halfPx - 6}
              y2={footOf(label) - 10}
              className="stroke-oxide"
              strokeWidth="1.25"
            />
          );
        })}
      {row.labels.map((label) => (
        <text
          key={`${label.x} ${label.full}`}
          x={xOf(label.x) + 5}
          y={footOf(label)}
          className={`${LABEL_TONES[label.tone]} stroke-vellum`}
          strokeWidth="4"
          strokeLinejoin="round"
          paintOrder="stroke"
        >
          <title>{label.full}</title>
          <tspan className="font-semibold">{label.strong}</tspan>
          {label.plain && <tspan className="fill-lead-grey"> {label.plain}</tspan>}
        </text>
      ))}
    </g>
  );
}
