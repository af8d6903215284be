/** Tabby: over one, under the next, the row after it the other way about, each row laid in hills and then pressed down. */
import type { Figure } from '#core/craft/figures/figure.ts';
import type { LaidRow } from '#core/craft/figures/kit/lay-runs.ts';
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { rowRuns } from '#core/craft/figures/kit/rows.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';
import { tabbyFace, tabbyRow } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 72, step: 46, count: 9, top: 12, bottom: 258 };
const PITCH = 19;
const HILL = 36;

export const TABBY: Figure = {
  title: 'Tabby',
  height: 270,
  describe: ({ plan, units }) =>
    `The weft goes over one end and under the next; the row after it does the opposite. Each row is laid in hills and then pressed down, so that it takes ${lengthWords(plan.weft.pickMm, units, 'size')} of yarn.`,
  steps: () => [0, 1, 2, 3, 4].map((row) => ({ weight: 1, words: ROW_WORDS[row] ?? '' })),
  draw: (scene, input, progress) => {
    layWarp(scene, WARP, warpColour(input));
    const y = (row: number): number => 236 - row * PITCH;
    const rows = rowRuns(WARP, [0, 1, 2, 3, 4].map((row): LaidRow => {
      const lay = tabbyRow({ first: 0, last: WARP.count - 1 }, row, row % 2 === 0 ? 'left' : 'right');
      return row < 4 ? { lay, y: y(row), out: 18 } : { lay, y: y(row) - 10, out: 18, rise: hills };
    }));
    const tip = layStrand(scene, { colour: techniqueColour(input, 'tabby'), width: 13.5, runs: rows }, progress);
    if (progress < 1) needleAt(scene, tip);
    if (progress >= 1) {
      words(scene, 280, 34, 'laid in hills, then pressed down', { anchor: 'middle', patch: true });
      for (const x of [141, 279, 417]) handWay(scene, trail(x, 62).to(x, 100).points);
    }
  },
};

/** Of each row, as it is laid. */
const ROW_WORDS = [0, 1, 2, 3, 4].map((row) => {
  const ends = { first: 0, last: WARP.count - 1 };
  if (row === 4) return 'Lay each row in hills before you press it down, so that it takes yarn enough.';
  const begins = tabbyFace(row % 2 === 0 ? ends.last : ends.first, row) === 'front' ? 'over' : 'under';
  return `${row % 2 === 0 ? 'To the left' : 'To the right'}: ${repeatWords(tabbyRow(ends, row))}, beginning ${begins} the outermost end${row === 1 ? '. It does the opposite of the row below' : ''}.`;
});

/** Three hills over the width, level with the row at both edges and between the hills. */
function hills(x: number): number {
  const across = ((x - WARP.x) / (WARP.step * (WARP.count - 1))) * 3;
  return across <= 0 || across >= 3 ? 0 : HILL * Math.abs(Math.sin(across * Math.PI));
}
