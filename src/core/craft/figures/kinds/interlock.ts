/** Interlocked colours: in the gap between them each goes round the other before it turns back. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { pointer, words } from '#core/craft/figures/kit/marks.ts';
import { rowRuns } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';
import { colourEnds, tabbyRow, turnsBefore, type Ends, type Lay, type Way } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 60, step: 54, count: 9, top: 8, bottom: 250 };
const PITCH = 26;
const ROWS = 7;
const BOTTOM = 230;
const GAP = 4;

export const INTERLOCK: Figure = {
  title: 'Interlocked colours',
  height: 272,
  describe: () => 'Two colours meet in the gap between two ends. Each goes round the other there and turns back, so the edge is straight and closed.',
  steps: () => [
    { weight: 1, words: 'Both colours come to the gap from their own sides.' },
    { weight: 3, words: 'In the gap one goes round the other, and both turn back. Every second row they hook again, always in the same gap.' },
  ],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    const [left, right] = colourEnds({ first: 0, last: WARP.count - 1 }, GAP, 'interlock');
    layWarp(scene, WARP, warpColour(input));
    layColour(scene, first, left, 'right', 6, progress);
    layColour(scene, ground, right, 'left', 0, progress);
    if (progress < 1) return;
    const x = WARP.x + WARP.step * (GAP - 0.5);
    words(scene, x, 26, 'hooked in the gap', { anchor: 'middle', patch: true, size: 17 });
    pointer(scene, { x, y: 32 }, { x, y: 62 });
  },
};

/** @param drop so far its rows lie lower, so that its bows go through those of the other */
function layColour(scene: Scene, colour: string, ends: Ends, begin: Way, drop: number, share: number): void {
  const lays = Array.from({ length: ROWS }, (_, row): Lay => tabbyRow(ends, row, (row % 2 === 0) === (begin === 'right') ? 'right' : 'left'));
  const rows = lays.map((lay, row) => ({ lay, y: BOTTOM + drop - row * PITCH, out: WARP.step * 0.44 }));
  layStrand(scene, { colour, width: 11, runs: hooked(rowRuns(WARP, rows), lays, begin) }, share);
}

/** The bows at the gap go over one half of their way and under the other: that is what hooks them. */
function hooked(runs: readonly Run[], lays: readonly Lay[], begin: Way): Run[] {
  const turns = new Set<number>();
  let at = 0;
  lays.forEach((lay, row) => {
    at += lay.length;
    const [last, next] = [lay.at(-1), lays[row + 1]?.[0]];
    if (last === undefined || next === undefined || !turnsBefore(next, last)) return;
    if (last.way === begin) turns.add(at);
    at += 1;
  });
  return runs.flatMap((run, index): Run[] => {
    if (!turns.has(index)) return [run];
    const middle = Math.floor(run.points.length / 2);
    const [over, under] = begin === 'right' ? [LEVEL.above, LEVEL.behind] : [LEVEL.front, LEVEL.front];
    return [{ ...run, level: over, points: run.points.slice(0, middle + 1) }, { ...run, level: under, points: run.points.slice(middle) }];
  });
}
