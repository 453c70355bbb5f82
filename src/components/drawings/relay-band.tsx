import { useRef } from 'react';
import { bandModel } from '../../../shared/engines/band/band-model.ts';
import type { BandInput, BandStep } from '../../../shared/engines/band/band-types.ts';
import { ACROSS_FROM_PX, charactersAcross, gutterFor } from './band-geometry.ts';
import type { RingTints } from './band-shapes.tsx';
import { RelayBandAcross } from './relay-band-across.tsx';
import { RelayBandDown } from './relay-band-down.tsx';
import { useContainerWidth } from './use-container-width.ts';

export interface RelayBandProps {
  /** Names the band for readers: "The way of The Salt Lantern". */
  label: string;
  input: BandInput;
  /** Tints of the two shops of a handoff, for its half rings. */
  tintsOf?: (handoffId: string) => RingTints | null;
}

/**
 * The commission as a band: a tube per travelling part, from brief to delivery. Across where there are 720 px, downwards
 * below. Readers get the same steps in the same order.
 */
export function RelayBand({ label, input, tintsOf }: RelayBandProps) {
  const figure = useRef<HTMLElement>(null);
  const widthPx = useContainerWidth(figure, ACROSS_FROM_PX);
  const gutterPx = gutterFor(input.parts.map((part) => part.name));
  const model = bandModel(input, charactersAcross(widthPx, gutterPx));
  const across = widthPx >= ACROSS_FROM_PX;
  return (
    <figure ref={figure} aria-label={label} className="min-w-0">
      {across ? (
        <>
          <RelayBandAcross model={model} widthPx={widthPx} gutterPx={gutterPx} tintsOf={tintsOf} />
          <ol className="sr-only">
            {model.steps.map((step) => (
              <li key={`${step.kind} ${step.id}`}>{stepInWords(step)}</li>
            ))}
          </ol>
        </>
      ) : (
        <RelayBandDown model={model} tintsOf={tintsOf} />
      )}
    </figure>
  );
}

const stepInWords = ({ partName, title, words, here }: BandStep): string =>
  `${partName ? `${partName}: ` : ''}${title}, ${words}${here ? ' (here now)' : ''}`;
