export interface HatchProps {
  id: string;
  /** Class that gives the lines their colour, as "stroke-gun-blue". */
  lineClass: string;
  /** Direction of the lines: mating parts are hatched against each other (ISO 128-3). */
  lean?: 'right' | 'left' | 'cross';
  spacingPx?: number;
}

/** Thin parallel lines at 45 degrees, as sections and zones are filled in technical drawings. */
export function Hatch({ id, lineClass, lean = 'right', spacingPx = 7 }: HatchProps) {
  const turn = lean === 'left' ? -45 : 45;
  return (
    <pattern
      id={id}
      width={spacingPx}
      height={spacingPx}
      patternUnits="userSpaceOnUse"
      patternTransform={`rotate(${turn})`}
    >
      <line x1="0" y1="0" x2="0" y2={spacingPx} className={lineClass} strokeWidth="1.6" />
      {lean === 'cross' && <line x1="0" y1="0" x2={spacingPx} y2="0" className={lineClass} strokeWidth="1.6" />}
    </pattern>
  );
}
