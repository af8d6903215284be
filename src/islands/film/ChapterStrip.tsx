import { clockTime } from '#core/captions/clock-time.ts';
import { stretchAt, type Stretch } from './stretches.ts';

interface ChapterStripProps {
  title: string;
  stretches: readonly Stretch[];
  durationMs: number;
  atMs: number;
  onJump: (ms: number) => void;
}

const WIDTH = 1_000;
const GAP = 12;
const PICK = 10;

/** The film as cloth: woven where it was watched, bare warp after, the fell at its place. A slider lies over it. */
export function ChapterStrip({ title, stretches, durationMs, atMs, onJump }: ChapterStripProps) {
  const scale = WIDTH / Math.max(1, durationMs);
  const fell = Math.min(WIDTH, atMs * scale);
  const here = stretches[stretchAt(stretches, atMs)]?.title;
  return (
    <div className="strip-of-film">
      <svg className="chapters" viewBox={`0 0 ${WIDTH} 18`} preserveAspectRatio="none" aria-hidden>
        {stretches.map(({ fromMs, toMs, woven }) => {
          const x = fromMs * scale;
          const width = Math.max(2, (toMs - fromMs) * scale - GAP);
          return (
            <g key={fromMs}>
              <path className="bare" d={warps(x, width)} />
              {woven > 0 && <rect className="woven" x={x} y="2" width={width * woven} height="14" />}
              {woven > 0 && <path className="row-of" d={warps(x, width * woven)} />}
            </g>
          );
        })}
        <rect className="fell" x={Math.max(0, fell - 2)} width="4" height="18" />
      </svg>
      <input type="range" min={0} max={durationMs} step={1_000} value={Math.min(atMs, durationMs)} aria-label={`Place in ${title}`} aria-valuetext={`${clockTime(atMs)} of ${clockTime(durationMs)}${here == null ? '' : `, ${here}`}`} onChange={(event) => onJump(Number(event.currentTarget.value))} />
    </div>
  );
}

/** Upright threads across a stretch. */
function warps(x: number, width: number): string {
  const lines: string[] = [];
  for (let at = x + 1; at < x + width; at += PICK) lines.push(`M${at.toFixed(1)} 2h2v14h-2z`);
  return lines.join('');
}
