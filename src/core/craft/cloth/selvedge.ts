/**
 * Weft turning round the last end: at the right after even rows, at the left after odd ones. It lies under the beads.
 * A row that does not reach the edge does not turn there.
 */
import { shade } from './colour.ts';
import { ROUND, num } from './markup.ts';
import type { PickRow } from './picks.ts';
import type { Weave } from './weave.ts';

export function drawSelvedge(rows: readonly PickRow[], pitch: number, colour: string, weave: Weave): string {
  const out = Math.min(pitch * 0.5, weave.end * 0.42);
  let d = '';
  rows.forEach((row, index) => {
    const next = rows[index + 1];
    if (next === undefined) return;
    const rise = next.y - row.y;
    if (rise > pitch * 1.5) return;
    if (row.odd && row.x0 === 0 && next.x0 === 0) d += `M1 ${num(row.y)}h-1a${num(out)} ${num(rise / 2)} 0 0 0 0 ${num(rise)}h1`;
    const atRight = weave.width - row.x1 < 0.5 && weave.width - next.x1 < 0.5;
    if (!row.odd && atRight) d += `M${num(weave.width - 1)} ${num(row.y)}h1a${num(out)} ${num(rise / 2)} 0 0 1 0 ${num(rise)}h-1`;
  });
  const drawn = weave.paths.stroke(d, shade(colour, 0.45), pitch * 0.8, ROUND);
  return pitch > 3.4 ? drawn + weave.paths.stroke(d, shade(colour, 0.06), pitch * 0.54, ROUND) : drawn;
}
