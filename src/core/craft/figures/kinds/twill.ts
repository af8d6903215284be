/** Twill: over two ends and under two, moved on by one end in every row, so that the floats climb in slanting lines. */
import type { Figure } from '#core/craft/figures/figure.ts';
import type { LaidRow } from '#core/craft/figures/kit/lay-runs.ts';
import { words } from '#core/craft/figures/kit/marks.ts';
import { rowRuns } from '#core/craft/figures/kit/rows.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';
import { twillRow } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 76, step: 37, count: 12, top: 10, bottom: 262 };
const ENDS = { first: 0, last: WARP.count - 1 };
const ROWS = 8;
const BOTTOM = 236;
const PITCH = 23;

export const TWILL: Figure = {
  title: 'Twill',
  height: 274,
  describe: () => 'The weft goes over two ends and under the next two. In every row it all moves on by one end, so that the floats climb in slanting lines; after four rows it begins again.',
  steps: () => Array.from({ length: ROWS }, (_, row) => ({
    weight: 1,
    words: row === 0 ? `To the right: ${repeatWords(twillRow(ENDS, 0))}.` : `${row % 2 === 1 ? 'Back to the left' : 'To the right again'}, each float one end further to the right than in the row below${row === 4 ? '. Here the first row comes again' : ''}.`,
  })),
  draw: (scene, input, progress) => {
    layWarp(scene, WARP, warpColour(input));
    const rows = Array.from({ length: ROWS }, (_, row): LaidRow => ({ lay: twillRow(ENDS, row), y: BOTTOM - row * PITCH, out: 18 }));
    const tip = layStrand(scene, { colour: techniqueColour(input, 'tabby'), width: 15, runs: rowRuns(WARP, rows) }, progress);
    if (progress < 1) needleAt(scene, tip);
    else words(scene, 280, 36, 'over two, under two, one end further each row', { anchor: 'middle', patch: true, size: 17 });
  },
};
