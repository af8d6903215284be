/** Doubled ends: two neighbours are always taken up as one. */
import { num } from '#core/craft/cloth/markup.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { measure, words } from '#core/craft/figures/kit/marks.ts';
import { rowRuns } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';
import { basketRow, type Lay } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 64, step: 48, count: 10, top: 12, bottom: 206 };

const rowAt = (row: number): Lay => basketRow({ first: 0, last: 9 }, row, 2, row % 2 === 0 ? 'left' : 'right');

export const DOUBLED_ENDS: Figure = {
  title: 'Doubled ends',
  height: 270,
  describe: (input) =>
    `Two neighbouring ends count as one: the weft goes over two and under two. From one pair to the next is ${lengthWords(pairMm(input), input.units, 'fine')}.`,
  steps: () => ['Two neighbours are taken up as one', 'The next row does the opposite', 'And so on'].map((words, row) => ({ weight: 1, words: `${words}: ${repeatWords(rowAt(row))}.` })),
  draw: (scene, input, progress) => {
    layWarp(scene, WARP, warpColour(input));
    const rows = rowRuns(WARP, [0, 1, 2].map((row) => ({ lay: rowAt(row), y: 150 - 32 * row, out: 16 })));
    const tip = layStrand(scene, { colour: techniqueColour(input, 'tabby'), width: 13, runs: rows }, progress);
    if (progress < 1) needleAt(scene, tip);
    for (let pair = 0; pair < 5; pair++) {
      const a = WARP.x + WARP.step * 2 * pair;
      scene.add(LEVEL.marks, `<path class="draw-line" d="M${num(a - 6)} 212q0 12 12 12h${num(WARP.step / 2 - 6)}v8v-8h${num(WARP.step / 2 - 6)}q12 0 12-12" stroke="#111e33" stroke-width="1.5"/>`);
      words(scene, a + WARP.step / 2, 252, String(pair + 1), { anchor: 'middle' });
    }
    const first = WARP.x + WARP.step / 2;
    measure(scene, { x: first + WARP.step * 2, y: 32 }, { x: first + WARP.step * 4, y: 32 }, lengthWords(pairMm(input), input.units, 'fine'));
  },
};

function pairMm(input: FigureInput): number {
  return input.piece.warp.endsTogether === 2 ? input.plan.ends.spacingMm : 2 * input.plan.ends.spacingMm;
}
