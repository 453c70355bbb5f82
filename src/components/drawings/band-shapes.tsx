import type { RingState } from '../../../shared/engines/band/band-types.ts';
import type { ShopTint } from '../../../shared/contracts/vocabulary.ts';
import { joinClasses } from '../ui/join-classes.ts';

/** Tints of the two shops of a handoff. */
export interface RingTints {
  from: ShopTint;
  to: ShopTint;
}

const TINT_STROKE: Record<ShopTint, string> = {
  verdigris: 'stroke-verdigris',
  brass: 'stroke-brass',
  'gun-blue': 'stroke-gun-blue',
  oxide: 'stroke-oxide',
  plum: 'stroke-plum',
  moss: 'stroke-moss',
};

/** Light on turned metal, across the tube: dark edge, body, a lit line above the middle, body, dark edge. */
export function MetalGradients({ id }: { id: string }) {
  return (
    <>
      <linearGradient id={`${id}-finished`} x1="0" y1="0" x2="0" y2="1">
        <stop offset="0" className="[stop-color:var(--done-body)]" />
        <stop offset="0.36" className="[stop-color:var(--done-lit)]" />
        <stop offset="0.62" className="[stop-color:var(--done-body)]" />
        <stop offset="1" className="[stop-color:var(--done-shade)]" />
      </linearGradient>
      <linearGradient id={`${id}-under-way`} x1="0" y1="0" x2="0" y2="1">
        <stop offset="0" className="[stop-color:var(--work-body)]" />
        <stop offset="0.36" className="[stop-color:var(--work-lit)]" />
        <stop offset="0.62" className="[stop-color:var(--work-body)]" />
        <stop offset="1" className="[stop-color:var(--work-shade)]" />
      </linearGradient>
      <linearGradient id={`${id}-likely`} x1="0" y1="0" x2="1" y2="0">
        <stop offset="0" className="[stop-color:var(--gun-blue)]" stopOpacity="0.06" />
        <stop offset="0.45" className="[stop-color:var(--gun-blue)]" stopOpacity="0.5" />
        <stop offset="1" className="[stop-color:var(--gun-blue)]" stopOpacity="0" />
      </linearGradient>
    </>
  );
}

export interface TubeShapeProps {
  x0: number;
  x1: number;
  axisY: number;
  halfPx: number;
  state: 'planned' | 'under-way' | 'finished';
  gradientId: string;
}

/** A length of tube: metal when worked on or done, a dashed outline while planned. */
export function TubeShape({ x0, x1, axisY, halfPx, state, gradientId }: TubeShapeProps) {
  const x = x0 + 1;
  const width = Math.max(4, x1 - x0 - 2);
  const edge = state === 'finished' ? 'stroke-done-edge' : 'stroke-work-edge';
  if (state === 'planned')
    return (
      <rect
        x={x}
        y={axisY - halfPx}
        width={width}
        height={halfPx * 2}
        rx="2"
        className="fill-vellum stroke-lead-grey"
        strokeDasharray="5 3"
        strokeWidth="1.25"
      />
    );
  return (
    <g className={edge}>
      <rect
        x={x}
        y={axisY - halfPx}
        width={width}
        height={halfPx * 2}
        rx="2"
        fill={`url(#${gradientId}-${state})`}
        strokeWidth="1.25"
      />
      {width > 40 && (
        <path
          d={`M${x + 6} ${axisY - halfPx}v${halfPx * 2}M${x + width - 6} ${axisY - halfPx}v${halfPx * 2}`}
          strokeWidth="1"
          strokeOpacity="0.45"
        />
      )}
    </g>
  );
}

export interface RingShapeProps {
  x: number;
  y: number;
  rx: number;
  ry: number;
  state: RingState;
  tints?: RingTints | null | undefined;
}

/**
 * Where a part changes hands: thin while no day is agreed, a thick half for the side that offered, closed when both have
 * agreed, filled when it is done.
 */
export function RingShape({ x, y, rx, ry, state, tints }: RingShapeProps) {
  const half = (side: 'from' | 'to') => `M${x} ${y - ry}A${rx} ${ry} 0 0 ${side === 'from' ? 0 : 1} ${x} ${y + ry}`;
  const thick = (side: 'from' | 'to') => (
    <path
      d={half(side)}
      className={joinClasses('fill-none', TINT_STROKE[tints?.[side] ?? 'verdigris'])}
      strokeWidth="3.5"
    />
  );
  if (state === 'done')
    return (
      <>
        <ellipse cx={x} cy={y} rx={rx} ry={ry} className="fill-brass stroke-soot" strokeWidth="1.25" />
        <ellipse cx={x} cy={y} rx={rx * 0.4} ry={ry * 0.8} className="fill-work-lit" fillOpacity="0.55" />
      </>
    );
  return (
    <>
      <ellipse cx={x} cy={y} rx={rx} ry={ry} className="fill-vellum stroke-lead-grey" strokeWidth="1.25" />
      {(state === 'from-agrees' || state === 'agreed') && thick('from')}
      {(state === 'to-agrees' || state === 'agreed') && thick('to')}
    </>
  );
}

/** A saw cut through the tube: the work is held here. */
export function SawCut({ x, axisY, halfPx }: { x: number; axisY: number; halfPx: number }) {
  const teeth = 6;
  const top = axisY - halfPx - 6;
  const step = (halfPx * 2 + 12) / teeth;
  const cut = (dx: number) =>
    `M${x + dx - 3} ${top}` + Array.from({ length: teeth }, (_, at) => `l${at % 2 === 0 ? 6 : -6} ${step}`).join('');
  return (
    <g className="fill-none" strokeLinejoin="miter">
      <path d={cut(0)} className="stroke-vellum" strokeWidth="7" />
      <path d={cut(-3.5)} className="stroke-oxide" strokeWidth="1.75" />
      <path d={cut(3.5)} className="stroke-oxide" strokeWidth="1.75" />
    </g>
  );
}

/** A small turned bead: the part is here now. */
export function Bead({ x, y, r }: { x: number; y: number; r: number }) {
  return (
    <g>
      <circle cx={x} cy={y} r={r} className="fill-soot stroke-vellum" strokeWidth="1.75" />
      <circle cx={x - r * 0.3} cy={y - r * 0.32} r={r * 0.26} className="fill-vellum" />
    </g>
  );
}
