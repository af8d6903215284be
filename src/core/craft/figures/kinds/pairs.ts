/** Two threads in one shed: as a doubled weft over single ends, and as basket over two ends at a time. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { words } from '#core/craft/figures/kit/marks.ts';
import { rowRuns } from '#core/craft/figures/kit/rows.ts';
import type { Scene } from '#core/craft/figures/kit/scene.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';
import { basketRow, tabbyRow, type Lay } from '#core/craft/interlacement/lay.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';

const WARP: WarpLines = { x: 66, step: 39, count: 12, top: 10, bottom: 238 };
const ENDS = { first: 0, last: WARP.count - 1 };
const ROWS = 4;
const BOTTOM = 206;
const PITCH = 40;
/** Half of what lies between the middles of the two threads. */
const APART = 7;

/** Both threads go through every shed together, one beside the other; they never cross. */
function layPairs(scene: Scene, input: FigureInput, rowOf: (row: number) => Lay, progress: number): void {
  const colour = techniqueColour(input, 'tabby');
  layWarp(scene, WARP, warpColour(input));
  for (const side of [1, -1]) {
    const runs = rowRuns(WARP, Array.from({ length: ROWS }, (_, row) => ({ lay: rowOf(row), y: BOTTOM - row * PITCH + side * APART, out: 18 + 3 * side })));
    const tip = layStrand(scene, { colour: side > 0 ? colour : shade(colour, 0.14), width: 10, runs }, progress);
    if (progress < 1) needleAt(scene, tip);
  }
}

const rowSteps = (rowOf: (row: number) => Lay, first: string): { weight: number; words: string }[] =>
  Array.from({ length: ROWS }, (_, row) => ({
    weight: 1,
    words: row === 0 ? `${first}: ${repeatWords(rowOf(0))}.` : `${row % 2 === 1 ? 'Back to the left' : 'To the right again'}, the other way about from the row below.`,
  }));

const basketAt = (row: number): Lay => basketRow(ENDS, row);
const tabbyAt = (row: number): Lay => tabbyRow(ENDS, row);

export const BASKET: Figure = {
  title: 'Basket',
  height: 250,
  describe: () => 'Two threads together go over two ends and under the next two. The row after it does the opposite, so the cloth is made of small squares.',
  steps: () => rowSteps(basketAt, 'Two threads together, two ends at a time'),
  draw: (scene, input, progress) => {
    layPairs(scene, input, basketAt, progress);
    if (progress >= 1) words(scene, 280, 34, 'two threads over two ends', { anchor: 'middle', patch: true, size: 17 });
  },
};

export const DOUBLED_WEFT: Figure = {
  title: 'Doubled weft',
  height: 250,
  describe: () => 'Two threads are taken through each shed as one, over one end and under the next. They lie side by side and fill the row better than one.',
  steps: () => rowSteps(tabbyAt, 'Two threads in one shed'),
  draw: (scene, input, progress) => {
    layPairs(scene, input, tabbyAt, progress);
    if (progress >= 1) words(scene, 280, 34, 'two threads, one shed', { anchor: 'middle', patch: true, size: 17 });
  },
};
