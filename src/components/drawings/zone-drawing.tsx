import { useId, useRef } from 'react';
import { formatMm } from '../../../shared/units/length.ts';
import { DrawingFrame } from './drawing-frame.tsx';
import { ratioInWords } from './drawing-scale.ts';
import { fitInWords, signedUm } from './fit-side.ts';
import type { FitSide } from './fit-side.ts';
import { Hatch } from './hatch.tsx';
import { useContainerWidth } from './use-container-width.ts';
import { layoutZones, ZONE_TEXT_PX } from './zone-layout.ts';
import type { PlacedText } from './zone-layout.ts';

export interface ZoneDrawingProps {
  /** What is drawn: "Pommel spigot in hilt bore". */
  title: string;
  nominalMm: number;
  /** The nominal size in the reader's unit; millimetres when left out. */
  nominalInWords?: string;
  hole: FitSide;
  shaft: FitSide;
}

/**
 * Tolerance zones about the zero line as ISO 286-1 draws them, with the readings beside: circles for the hole, squares
 * for the shaft, the worst pair hatched between smallest hole and largest shaft.
 */
export function ZoneDrawing({ title, nominalMm, nominalInWords, hole, shaft }: ZoneDrawingProps) {
  const figure = useRef<HTMLElement>(null);
  const widthPx = useContainerWidth(figure, 640);
  const id = useId();
  const zeroLine = nominalInWords ?? formatMm(nominalMm);
  const layout = layoutZones(widthPx, zeroLine, hole, shaft);
  const { plot, labels } = layout;
  const worstTone = interferes(hole, shaft) ? 'oxide' : 'verdigris';
  return (
    <DrawingFrame
      title={`Tolerance zones: ${title}`}
      description={fitInWords(zeroLine, hole, shaft)}
      widthPx={widthPx}
      heightPx={layout.heightPx}
      containerRef={figure}
      scaleNote={`Up and down ${ratioInWords(layout.ratio)} on paper; sideways not to scale.`}
    >
      <defs>
        <Hatch id={`${id}-hole`} lineClass="stroke-gun-blue" lean="right" />
        <Hatch id={`${id}-shaft`} lineClass="stroke-brass" lean="left" />
        <Hatch
          id={`${id}-worst`}
          lineClass={worstTone === 'oxide' ? 'stroke-oxide/60' : 'stroke-verdigris/60'}
          spacingPx={6}
        />
      </defs>

      <text
        x={plot.x - 8}
        y={plot.y - 14}
        textAnchor="end"
        className="fill-lead-grey font-mono"
        fontSize={ZONE_TEXT_PX}
      >
        µm
      </text>
      {layout.ticks.map(({ valueUm, y }) => (
        <g key={valueUm}>
          <line x1={plot.x} x2={plot.x + plot.width} y1={y} y2={y} className="stroke-hairline" />
          <text
            x={plot.x - 8}
            y={y + 4.5}
            textAnchor="end"
            className="fill-lead-grey font-mono"
            fontSize={ZONE_TEXT_PX}
          >
            {signedUm(valueUm)}
          </text>
        </g>
      ))}

      {layout.worst && <rect {...layout.worst} fill={`url(#${id}-worst)`} />}
      {layout.holeZone && (
        <rect {...layout.holeZone} fill={`url(#${id}-hole)`} className="stroke-gun-blue" strokeWidth="1.25" />
      )}
      {layout.shaftZone && (
        <rect {...layout.shaftZone} fill={`url(#${id}-shaft)`} className="stroke-brass" strokeWidth="1.25" />
      )}
      <line
        x1={plot.x}
        x2={plot.x + plot.width}
        y1={layout.zeroY}
        y2={layout.zeroY}
        className="stroke-soot"
        strokeWidth="1.75"
      />
      {layout.holePoints.map(({ x, y }, at) => (
        <circle key={at} cx={x} cy={y} r="4.25" className="fill-vellum stroke-gun-blue" strokeWidth="2" />
      ))}
      {layout.shaftPoints.map(({ x, y }, at) => (
        <rect key={at} x={x - 4} y={y - 4} width="8" height="8" className="fill-brass stroke-vellum" strokeWidth="1" />
      ))}

      <Words at={labels.holeZone} />
      <Words at={labels.shaftZone} />
      <Words at={labels.zero} className="fill-lead-grey" />
      <Words
        at={labels.worst}
        className={worstTone === 'oxide' ? 'fill-oxide font-semibold' : 'fill-verdigris font-semibold'}
      />
      <Words at={labels.holeReadings} className="fill-lead-grey" />
      <Words at={labels.shaftReadings} className="fill-lead-grey" />
    </DrawingFrame>
  );
}

const interferes = (hole: FitSide, shaft: FitSide): boolean =>
  Math.min(...hole.readingsUm) < Math.max(...shaft.readingsUm);

/** Words over the drawing, with an edge in the sheet's colour so that a grid line never runs through a letter. */
function Words({ at, className = 'fill-soot' }: { at: PlacedText | null; className?: string }) {
  if (!at) return null;
  return (
    <text
      x={at.x}
      y={at.y}
      textAnchor="middle"
      fontSize={ZONE_TEXT_PX}
      className={`${className} stroke-vellum`}
      strokeWidth="4"
      strokeLinejoin="round"
      paintOrder="stroke"
    >
      {at.text}
    </text>
  );
}
