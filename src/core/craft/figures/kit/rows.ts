/** Rows that follow each other with one thread, turning round the last end each time. */
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run, type Tip } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { layRuns, signOf, type LaidRow } from '#core/craft/figures/kit/lay-runs.ts';
import type { WarpLines } from '#core/craft/figures/kit/warp.ts';
import { tabbyRow } from '#core/craft/interlacement/lay.ts';

/** The runs of several rows and of the turns between them. Each row must begin at the side where the one before it ended. */
export function rowRuns(warp: WarpLines, rows: readonly LaidRow[]): Run[] {
  const runs: Run[] = [];
  for (const row of rows) {
    const own = layRuns(warp, row);
    const from = runs.at(-1)?.points.at(-1);
    const to = own[0]?.points[0];
    if (from !== undefined && to !== undefined) {
      const side = -signOf(row.lay[0] ?? { way: 'right' });
      const out = Math.max(5, Math.abs(from.y - to.y) * 0.45);
      const x = side < 0 ? Math.min(from.x, to.x) : Math.max(from.x, to.x);
      runs.push({ level: LEVEL.behind, points: trail(from.x, from.y).curve(x + side * out, from.y, x + side * out, to.y, to.x, to.y).points });
    }
    runs.push(...own);
  }
  return runs;
}

interface Field {
  readonly colour: string;
  readonly width: number;
  /** Lowest row, and the distance from row to row. */
  readonly bottom: number;
  readonly pitch: number;
  readonly rows: number;
  readonly first: number;
  readonly last: number;
  readonly share?: number;
  readonly out?: number;
}

/** A stretch of plain cloth from the lowest row up, the first row running to the right. */
export function layField(scene: Scene, warp: WarpLines, field: Field): Tip | undefined {
  const ends = { first: Math.min(field.first, field.last), last: Math.max(field.first, field.last) };
  const begin = field.first <= field.last ? 0 : 1;
  const picks = Array.from({ length: field.rows }, (_, row): LaidRow => ({
    lay: tabbyRow(ends, row, (row + begin) % 2 === 0 ? 'right' : 'left'),
    y: field.bottom - row * field.pitch,
    ...(field.out === undefined ? {} : { out: field.out }),
  }));
  return layStrand(scene, { colour: field.colour, width: field.width, runs: rowRuns(warp, picks) }, field.share ?? 1);
}
