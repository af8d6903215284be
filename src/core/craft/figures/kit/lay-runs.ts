/** A lay as the runs of a strand: what passes in front and what behind, at the height where the row lies. */
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import type { Run } from '#core/craft/figures/kit/strand.ts';
import { trail, type Point } from '#core/craft/figures/kit/trail.ts';
import { endX, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { turnsBefore, twinedRow, type Face, type Lay, type Pass } from '#core/craft/interlacement/lay.ts';

/** A thread's way and where its row lies in the figure, in pixels. */
export interface LaidRow {
  readonly lay: Lay;
  readonly y: number;
  /** How far the row stands out past its first and its last end. */
  readonly out?: number;
  /** Raises the row above `y`, for rows that are laid in hills. */
  readonly rise?: (x: number) => number;
  /** A stretch in front begins so far above `y` and ends as far below it; behind, the thread comes up again. */
  readonly lean?: number;
}

export const levelOf = (face: Face): number => (face === 'front' ? LEVEL.front : LEVEL.behind);
export const signOf = ({ way }: Pick<Pass, 'way'>): 1 | -1 => (way === 'right' ? 1 : -1);

/** Between two ends the thread changes sides half-way; round an end it turns close to it. */
export function layRuns(warp: WarpLines, row: LaidRow): Run[] {
  const { lay, out = warp.step * 0.5 } = row;
  const half = warp.step / 2;
  const runs: Run[] = [];
  lay.forEach((pass, index) => {
    const way = signOf(pass);
    const before = lay[index - 1];
    const a = endX(warp, pass.from) - way * (index === 0 ? out : half);
    const b = endX(warp, pass.to) + way * (index === lay.length - 1 ? out : half);
    const at = runs.at(-1)?.points.at(-1);
    const turned = before !== undefined && turnsBefore(pass, before) && at !== undefined;
    runs.push({ level: levelOf(pass.face), points: turned ? roundEnd(at, signOf(before), b, pass, row) : stretch(a, b, pass, row) });
  });
  return runs;
}

function stretch(a: number, b: number, pass: Pass, { y, rise, lean = 0 }: LaidRow): readonly Point[] {
  if (rise !== undefined) return Array.from({ length: 7 }, (_, step) => {
    const x = a + ((b - a) * step) / 6;
    return { x, y: y - rise(x) };
  });
  return pass.face === 'front' ? trail(a, y - lean).to(b, y + lean).points : trail(a, y - lean).to(b, y - lean).points;
}

/** From where the thread is: behind, round the end and back; in front, straight on from behind it. */
function roundEnd(at: Point, going: 1 | -1, to: number, pass: Pass, { y, lean = 0 }: LaidRow): readonly Point[] {
  if (pass.face === 'front') return trail(at.x, at.y).to(to, y + lean).points;
  return trail(at.x, at.y).curve(at.x + going * 14, at.y, at.x + going * 10, y - lean, at.x - going * 4, y - lean).to(to, y - lean).points;
}

/** Both strands of a row of twining: in front each rises from `swing` below the row to as much above it, behind it sinks again. */
export function twinedRuns(warp: WarpLines, y: number, swing: number, ends = { first: 0, last: warp.count - 1 }): [Run[], Run[]] {
  const runsOf = (lay: Lay): Run[] =>
    lay.map((pass) => {
      const [x, up] = [endX(warp, pass.from), pass.face === 'front' ? 1 : -1];
      return { level: levelOf(pass.face), points: trail(x - warp.step / 2, y + up * swing).bend(x, y + up * swing * 0.34, x + warp.step / 2, y - up * swing).points };
    });
  const [one, two] = twinedRow(ends);
  return [runsOf(one), runsOf(two)];
}
