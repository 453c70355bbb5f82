/** Two rings through each other: two parts that a ferrule joins. Decorative; the word beside it says the name. */
export function BrandMark({ className = 'h-7 w-7' }: { className?: string }) {
  return (
    <svg aria-hidden viewBox="0 0 32 32" className={`${className} flex-none fill-none`} strokeWidth="3">
      <ellipse cx="12.5" cy="16" rx="6.8" ry="10.5" className="stroke-verdigris" />
      {/* Over the first ring above, under it below. */}
      <path d="M15.2 23.2A6.8 10.5 0 1 0 12.9 14.3" className="stroke-brass" transform="translate(.2 0)" />
    </svg>
  );
}

/** The name in wide capitals, as a stamp would set it. */
export function Wordmark() {
  return (
    <span className="text-head leading-none font-bold tracking-[0.09em] uppercase [font-stretch:125%]">Ferrule</span>
  );
}
