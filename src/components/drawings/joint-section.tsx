import { useId, useRef } from 'react';
import { formatMm } from '../../../shared/units/length.ts';
import { DiameterDimension, LengthDimension } from './dimension.tsx';
import { DrawingFrame } from './drawing-frame.tsx';
import { ratioInWords } from './drawing-scale.ts';
import { Hatch } from './hatch.tsx';
import { layoutSection } from './section-layout.ts';
import type { SectionInput, SectionLayout } from './section-layout.ts';
import { useContainerWidth } from './use-container-width.ts';

export interface JointSectionProps extends SectionInput {
  title: string;
  /** Names of the two features: "bore", "spigot". */
  holeName: string;
  shaftName: string;
  /** Writes a length in the reader's unit; millimetres when left out. */
  formatLength?: (valueMm: number) => string;
}

/** Section along the axis of a spigot in its bore, with the clearance enlarged by a stated factor and what comes off. */
export function JointSection({ title, holeName, shaftName, formatLength = formatMm, ...input }: JointSectionProps) {
  const figure = useRef<HTMLElement>(null);
  const widthPx = useContainerWidth(figure, 560);
  const id = useId();
  const layout = layoutSection(widthPx, input);
  const binds = input.shaftDiameterMm > input.holeDiameterMm;
  const bottomY = layout.axisY + layout.outerR;
  return (
    <DrawingFrame
      title={`Section: ${title}`}
      description={sectionInWords(input, holeName, shaftName, formatLength)}
      widthPx={widthPx}
      heightPx={layout.heightPx}
      containerRef={figure}
      scaleNote={[
        layout.exaggeration === 1
          ? `Scale ${ratioInWords(layout.ratio)} on paper.`
          : `Scale ${ratioInWords(layout.ratio)} on paper; clearance${input.removal ? ' and removal' : ''} drawn ${layout.exaggeration} times larger.`,
        ...(input.wallMm === null ? ['The outer wall is not measured; it is drawn as an example.'] : []),
      ].join(' ')}
    >
      <defs>
        <Hatch id={`${id}-outer`} lineClass="stroke-gun-blue/70" lean="right" spacingPx={8} />
        <Hatch id={`${id}-inner`} lineClass="stroke-brass/80" lean="left" spacingPx={6} />
        <Hatch id={`${id}-off`} lineClass="stroke-oxide" lean="cross" spacingPx={5} />
      </defs>
      <Half layout={layout} id={id} binds={binds} side={-1} />
      <Half layout={layout} id={id} binds={binds} side={1} />
      <FreeEnds layout={layout} />
      <line
        x1={layout.sleeveX - 14}
        x2={layout.endX + 14}
        y1={layout.axisY}
        y2={layout.axisY}
        className="stroke-lead-grey"
        strokeDasharray="14 4 3 4"
      />
      <DiameterDimension
        from={layout.axisY - layout.holeR}
        to={layout.axisY + layout.holeR}
        at={layout.sleeveX - 24}
        extendFrom={layout.sleeveX}
        words={`Ø ${formatLength(input.holeDiameterMm)}`}
      />
      <DiameterDimension
        from={layout.axisY - layout.shaftR}
        to={layout.axisY + layout.shaftR}
        at={layout.endX + 40}
        extendFrom={layout.shoulderX}
        words={`Ø ${formatLength(input.shaftDiameterMm)}`}
      />
      <LengthDimension
        from={layout.freeEndX}
        to={layout.shoulderX}
        at={bottomY + 54}
        extendFrom={bottomY + 4}
        words={formatLength(input.engagementMm)}
      />
      {layout.removal && input.removal && (
        <LengthDimension
          from={layout.removal.fromX}
          to={layout.removal.toX}
          at={bottomY + 26}
          extendFrom={bottomY + 4}
          words={`over ${formatLength(input.removal.overLengthMm)}`}
          className="stroke-oxide"
        />
      )}
      <text x={layout.sleeveX} y={18} fontSize="13" className="fill-gun-blue font-semibold">
        {holeName}
      </text>
      <text x={layout.endX} y={18} fontSize="13" textAnchor="end" className="fill-brass font-semibold">
        {shaftName}
      </text>
      {input.removal && (
        <text x={widthPx / 2} y={34} fontSize="13" textAnchor="middle" className="fill-oxide font-semibold">
          {formatLength(input.removal.onDiameterMm)} off the {input.removal.from === 'shaft' ? shaftName : holeName}
        </text>
      )}
    </DrawingFrame>
  );
}

/** Walls above (−1) or below (1) the axis; the lower half is the mirror of the upper one. */
function Half({ layout, id, binds, side }: { layout: SectionLayout; id: string; binds: boolean; side: 1 | -1 }) {
  const { axisY, sleeveX, freeEndX, shoulderX, endX, outerR, holeR, shaftR, removal } = layout;
  const y = (radius: number) => axisY + side * radius;
  const band = (fromX: number, toX: number, r1: number, r2: number) => `M${fromX} ${y(r1)}H${toX}V${y(r2)}H${fromX}Z`;
  return (
    <g strokeWidth="1.5" strokeLinejoin="round">
      <path d={band(sleeveX, shoulderX, holeR, outerR)} fill={`url(#${id}-outer)`} className="stroke-soot" />
      <path
        d={`M${freeEndX} ${axisY}V${y(shaftR)}H${shoulderX}V${y(outerR)}H${endX}V${axisY}`}
        fill={`url(#${id}-inner)`}
        className="stroke-soot"
      />
      {binds && (
        <path
          d={band(freeEndX, shoulderX, holeR, shaftR)}
          className="fill-oxide/25 stroke-oxide"
          strokeDasharray="4 3"
        />
      )}
      {removal && (
        <path
          d={
            removal.from === 'shaft'
              ? band(removal.fromX, removal.toX, shaftR - removal.depth, shaftR)
              : band(removal.fromX, removal.toX, holeR, holeR + removal.depth)
          }
          fill={`url(#${id}-off)`}
          className="stroke-oxide"
        />
      )}
    </g>
  );
}

/** Where the parts go on beyond the drawing: a freehand break line, as ISO 128-3 draws it. */
function FreeEnds({ layout: { axisY, sleeveX, endX, outerR } }: { layout: SectionLayout }) {
  const wave = (x: number) => {
    const step = (2 * outerR) / 4;
    return `M${x} ${axisY - outerR}` + [1, -1, 1, -1].map((lean) => `q${lean * 5} ${step / 2} 0 ${step}`).join('');
  };
  return (
    <g className="fill-none stroke-vellum" strokeWidth="5">
      <path d={wave(sleeveX)} />
      <path d={wave(endX)} />
      <g className="stroke-soot" strokeWidth="1">
        <path d={wave(sleeveX)} />
        <path d={wave(endX)} />
      </g>
    </g>
  );
}

function sectionInWords(
  { holeDiameterMm, shaftDiameterMm, engagementMm, removal }: SectionInput,
  holeName: string,
  shaftName: string,
  formatLength: (valueMm: number) => string,
): string {
  const gapUm = Math.round((holeDiameterMm - shaftDiameterMm) * 1000);
  const sentences = [
    `The ${shaftName}, ${formatLength(shaftDiameterMm)} across, in the ${holeName}, ${formatLength(holeDiameterMm)} across, over ${formatLength(engagementMm)}`,
    gapUm < 0 ? `They bind by ${-gapUm} µm` : `Clearance ${gapUm} µm`,
  ];
  if (removal)
    sentences.push(
      `${formatLength(removal.onDiameterMm)} comes off the ${removal.from === 'shaft' ? shaftName : holeName}, on diameter, over ${formatLength(removal.overLengthMm)}`,
    );
  return `${sentences.join('. ')}.`;
}
