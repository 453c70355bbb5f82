import { textWidthPx } from './text-width.ts';

export const DIMENSION_TEXT_PX = 13;

export interface DimensionProps {
  /** Ends along the measured direction, in pixels. */
  from: number;
  to: number;
  /** Where the dimension line stands, across the measured direction. */
  at: number;
  /** From where the extension lines start, across the measured direction. */
  extendFrom?: number;
  words: string;
  className?: string;
}

/**
 * A dimension along the axis: extension lines, arrow heads, the figure above the line, or beyond its end where the line
 * is too short for it (as ISO 129-1 sets it).
 */
export function LengthDimension({ from, to, at, extendFrom, words, className = 'stroke-lead-grey' }: DimensionProps) {
  const fits = textWidthPx(words, DIMENSION_TEXT_PX, 'mono') < to - from - 8;
  return (
    <g className={className} strokeWidth="1" fill="none">
      {extendFrom !== undefined && <path d={`M${from} ${extendFrom}V${at + 4}M${to} ${extendFrom}V${at + 4}`} />}
      <path d={`M${from} ${at}H${to}M${from + 7} ${at - 3}L${from} ${at}l7 3M${to - 7} ${at - 3}L${to} ${at}l-7 3`} />
      <text
        {...(fits ? { x: (from + to) / 2, y: at - 5, textAnchor: 'middle' } : { x: to + 8, y: at + 4.5 })}
        fontSize={DIMENSION_TEXT_PX}
        className="fill-soot stroke-vellum font-mono"
        strokeWidth="4"
        paintOrder="stroke"
      >
        {words}
      </text>
    </g>
  );
}

/** A diameter across the axis, its figure turned to read from the right. */
export function DiameterDimension({ from, to, at, extendFrom, words, className = 'stroke-lead-grey' }: DimensionProps) {
  const middle = (from + to) / 2;
  const textX = at - 5;
  return (
    <g className={className} strokeWidth="1" fill="none">
      {extendFrom !== undefined && <path d={`M${extendFrom} ${from}H${at}M${extendFrom} ${to}H${at}`} />}
      <path d={`M${at} ${from}V${to}M${at - 3} ${from + 7}L${at} ${from}l3 7M${at - 3} ${to - 7}L${at} ${to}l3 -7`} />
      <text
        x={textX}
        y={middle}
        transform={`rotate(-90 ${textX} ${middle})`}
        textAnchor="middle"
        fontSize={DIMENSION_TEXT_PX}
        className="fill-soot stroke-vellum font-mono"
        strokeWidth="4"
        paintOrder="stroke"
      >
        {words}
      </text>
    </g>
  );
}
