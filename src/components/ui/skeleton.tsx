export interface SkeletonProps {
  /** Lines to hold the place of. */
  lines?: number;
  /** What is being fetched, for those who listen: "Commissions are on their way". */
  label: string;
}

const WIDTHS = ['w-11/12', 'w-full', 'w-4/5', 'w-2/3'];

/** Holds the place of what is on its way. It stands still: nothing on the page flashes or pulses. */
export function Skeleton({ lines = 3, label }: SkeletonProps) {
  return (
    <div role="status" className="flex flex-col gap-3">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, at) => (
        <span key={at} aria-hidden className={`h-4 rounded bg-hairline/60 ${WIDTHS[at % WIDTHS.length]}`} />
      ))}
    </div>
  );
}
