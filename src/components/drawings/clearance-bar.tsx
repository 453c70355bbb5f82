import { scaleLinear } from 'd3-scale';
import { useId, useRef } from 'react';
import { DrawingFrame } from './drawing-frame.tsx';
import { PX_PER_MM, ratioInWords } from './drawing-scale.ts';
import { signedUm } from './fit-side.ts';
import { Hatch } from './hatch.tsx';
import { textWidthPx } from './text-width.ts';
import { useContainerWidth } from './use-container-width.ts';

export interface ClearanceBarProps {
  title: string;
  agreed: { minUm: number; maxUm: number } | null;
  /** Smallest hole less largest shaft. Below zero is interference. */
  worstUm: number;
  meanUm: number;
  /** Expanded uncertainty of the pair (k = 2), drawn as whiskers on the worst pair. */
  doubtUm: number;
}

const TEXT_PX = 13;
const HEIGHT_PX = 116;
const BAR = { y: 44, height: 26 };

/** Clearance on one line: the agreed range hatched, the worst pair with its doubt, the mean; left of zero it binds. */
export function ClearanceBar({ title, agreed, worstUm, meanUm, doubtUm }: ClearanceBarProps) {
  const figure = useRef<HTMLElement>(null);
  const widthPx = useContainerWidth(figure, 560);
  const id = useId();
  const all = [0, worstUm - doubtUm, worstUm + doubtUm, meanUm, ...(agreed ? [agreed.minUm, agreed.maxUm] : [])];
  const marginUm = Math.max(5, (Math.max(...all) - Math.min(...all)) * 0.08);
  const x = scaleLinear()
    .domain([Math.min(...all) - marginUm, Math.max(...all) + marginUm])
    .nice(5)
    .range([26, widthPx - 26]);
  const middleY = BAR.y + BAR.height / 2;
  const ticks = x.ticks(widthPx < 420 ? 4 : 7);
  const words = {
    worst: `worst ${signedUm(worstUm)} ± ${Math.round(doubtUm)}`,
    mean: `mean ${signedUm(meanUm)}`,
    agreed: agreed ? `agreed ${Math.round(agreed.minUm)}–${Math.round(agreed.maxUm)}` : '',
  };
  // Three rows at most: agreed on top, then worst and mean beside each other or, where they are near, on two rows.
  const clamp = (centreX: number, text: string) => {
    const half = textWidthPx(text, TEXT_PX, 'bold') / 2;
    return Math.min(Math.max(centreX, half + 2), widthPx - half - 2);
  };
  return (
    <DrawingFrame
      title={`Clearance: ${title}`}
      description={inWords({ agreed, worstUm, meanUm, doubtUm })}
      widthPx={widthPx}
      heightPx={HEIGHT_PX}
      containerRef={figure}
      scaleNote={`µm of clearance, ${ratioInWords(scaleOf(x))} on paper. Below zero the parts bind. Whiskers: gauge doubt (k=2).`}
    >
      <defs>
        <Hatch id={`${id}-agreed`} lineClass="stroke-verdigris" lean="left" />
        <Hatch id={`${id}-binds`} lineClass="stroke-oxide/35" lean="right" spacingPx={8} />
      </defs>
      <rect x={x.range()[0]} y={BAR.y} width={x(0) - x.range()[0]!} height={BAR.height} fill={`url(#${id}-binds)`} />
      {agreed && (
        <rect
          x={x(agreed.minUm)}
          y={BAR.y}
          width={Math.max(2, x(agreed.maxUm) - x(agreed.minUm))}
          height={BAR.height}
          fill={`url(#${id}-agreed)`}
          className="stroke-verdigris"
          strokeWidth="1.25"
        />
      )}
      {ticks.map((valueUm) => (
        <g key={valueUm}>
          <line
            x1={x(valueUm)}
            x2={x(valueUm)}
            y1={BAR.y + BAR.height}
            y2={BAR.y + BAR.height + 5}
            className="stroke-edge"
          />
          <text
            x={x(valueUm)}
            y={BAR.y + BAR.height + 20}
            textAnchor="middle"
            fontSize={TEXT_PX - 1}
            className="fill-lead-grey font-mono"
          >
            {signedUm(valueUm)}
          </text>
        </g>
      ))}
      <line
        x1={x.range()[0]}
        x2={x.range()[1]}
        y1={BAR.y + BAR.height}
        y2={BAR.y + BAR.height}
        className="stroke-edge"
      />
      <line x1={x(0)} x2={x(0)} y1={BAR.y - 6} y2={BAR.y + BAR.height + 6} className="stroke-soot" strokeWidth="1.75" />

      <g className="stroke-soot" strokeWidth="1.75">
        <line x1={x(worstUm - doubtUm)} x2={x(worstUm + doubtUm)} y1={middleY} y2={middleY} />
        <line x1={x(worstUm - doubtUm)} x2={x(worstUm - doubtUm)} y1={middleY - 6} y2={middleY + 6} />
        <line x1={x(worstUm + doubtUm)} x2={x(worstUm + doubtUm)} y1={middleY - 6} y2={middleY + 6} />
      </g>
      <path
        d={`M${x(worstUm)} ${middleY - 7}l6 7-6 7-6-7Z`}
        className={worstUm < 0 ? 'fill-oxide stroke-vellum' : 'fill-soot stroke-vellum'}
      />
      <circle cx={x(meanUm)} cy={middleY} r="5" className="fill-vellum stroke-soot" strokeWidth="2" />

      {agreed && (
        <text
          x={clamp(x((agreed.minUm + agreed.maxUm) / 2), words.agreed)}
          y={14}
          textAnchor="middle"
          fontSize={TEXT_PX}
          className="fill-verdigris font-semibold"
        >
          {words.agreed}
        </text>
      )}
      <text
        x={clamp(x(worstUm), words.worst)}
        y={36}
        textAnchor="middle"
        fontSize={TEXT_PX}
        className={worstUm < 0 ? 'fill-oxide font-semibold' : 'fill-soot font-semibold'}
      >
        {words.worst}
      </text>
      <text
        x={clamp(x(meanUm), words.mean)}
        y={HEIGHT_PX - 6}
        textAnchor="middle"
        fontSize={TEXT_PX}
        className="fill-soot"
      >
        {words.mean}
      </text>
    </DrawingFrame>
  );
}

const scaleOf = (x: (valueUm: number) => number): number => +((x(1000) - x(0)) / PX_PER_MM).toPrecision(2);

function inWords({ agreed, worstUm, meanUm, doubtUm }: Omit<ClearanceBarProps, 'title'>): string {
  const range = agreed ? `Agreed ${signedUm(agreed.minUm)} to ${signedUm(agreed.maxUm)} µm. ` : 'Nothing agreed. ';
  return `${range}Worst pair ${signedUm(worstUm)} µm, give or take ${Math.round(doubtUm)} µm. Mean ${signedUm(meanUm)} µm.`;
}
