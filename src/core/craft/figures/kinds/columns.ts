/** Two wefts by turns: the one always lies in the one shed, the other in the other, and upright columns come of it. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { layRuns } from '#core/craft/figures/kit/lay-runs.ts';
import { pointer, words } from '#core/craft/figures/kit/marks.ts';
import { stageOf } from '#core/craft/figures/kit/stages.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';
import { tabbyRow } from '#core/craft/interlacement/lay.ts';

/** A place within the cloth: the rows go on past both sides. */
const WARP: WarpLines = { x: 60, step: 40, count: 12, top: 8, bottom: 262 };
const ENDS = { first: 0, last: WARP.count - 1 };
const BOTTOM = 240;
/** So close that the rows close up, as they do in the cloth: what lies behind an end is hidden. */
const PITCH = 9;
/** Which of the two wefts lies in each row: by turns, then two rows of one, and by turns again. */
const WEFTS = [0, 1, 0, 1, 0, 1, 0, 1, 0, 1, 1, 0, 1, 0, 1, 0, 1, 0, 1, 0] as const;
const DOUBLE = 10;

export const COLUMNS: Figure = {
  title: 'Upright columns',
  height: 272,
  describe: () => 'Two wefts by turns, one row each, in plain tabby. Each lies over the same ends every time, so upright columns come of it. After two rows of one weft the columns change places.',
  steps: () => [
    { weight: DOUBLE, words: 'One row of the one weft, one row of the other, again and again: each always over the same ends.' },
    { weight: 1, words: 'One more row of the same weft, in the next shed.' },
    { weight: WEFTS.length - DOUBLE - 1, words: 'By turns again: the columns have changed places.' },
  ],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    layWarp(scene, WARP, warpColour(input));
    WEFTS.forEach((weft, row) => {
      const runs = layRuns(WARP, { lay: tabbyRow(ENDS, row, 'right'), y: BOTTOM - row * PITCH, out: 56 });
      layStrand(scene, { colour: weft === 0 ? ground : first, width: 15, runs }, stageOf(progress, row, WEFTS.length));
    });
    if (progress < 1) return;
    const y = BOTTOM - (DOUBLE - 0.5) * PITCH;
    words(scene, 280, 34, 'two rows of one weft: the columns change', { anchor: 'middle', patch: true, size: 17 });
    pointer(scene, { x: 280, y: 42 }, { x: 280, y });
  },
};
