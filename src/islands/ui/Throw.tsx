import { throwEnds } from '#islands/ui/throw-ends.ts';

/** How far a thing has come (`done` 0 to 1): a pick thrown across the warp, over a real progress element. */
export function Throw({ label, done }: { label: string; done: number }) {
  const percent = Math.round(Math.min(1, Math.max(0, done)) * 100);
  return (
    <div className="relative">
      <progress className="throw-value" max={100} value={percent} aria-label={label} />
      <svg className="throw" aria-hidden>
        <path className="end" d={throwEnds} />
        <line className="thread" x1="0" y1="7" x2={`${percent}%`} y2="7" />
        <svg x={`${percent}%`} overflow="visible">
          <rect className="fell-edge" x="-5" width="6" height="14" />
          <rect className="fell" x="-4" width="4" height="14" />
        </svg>
      </svg>
    </div>
  );
}
