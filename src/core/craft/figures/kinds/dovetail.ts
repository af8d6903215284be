/** Dovetailed colours: both turn round one shared end, one above the other in turn. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { pointer, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';
import { colourEnds } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 64, step: 52, count: 9, top: 8, bottom: 250 };
const PITCH = 23;
const ROWS = 8;
const BOTTOM = 230;
const SHARED = 4;

export const DOVETAIL: Figure = {
  title: 'Dovetailed colours',
  height: 272,
  describe: () => 'Two colours turn round the same end, one above the other in turn. There is no slit, and the edge between them is toothed.',
  steps: () => [
    { weight: 1, words: 'The left colour comes to the shared end, goes round it, and back.' },
    { weight: 3, words: 'The right colour comes to the same end and goes round it above. So they turn round it one after another, all the way up.' },
  ],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    const [left, right] = colourEnds({ first: 0, last: WARP.count - 1 }, SHARED, 'dovetail');
    layWarp(scene, WARP, warpColour(input));
    const field = { width: 10.5, pitch: PITCH, rows: ROWS, out: 10, share: progress };
    layField(scene, WARP, { ...field, colour: first, bottom: BOTTOM, ...left });
    layField(scene, WARP, { ...field, colour: ground, bottom: BOTTOM - PITCH / 2, first: right.last, last: right.first });
    if (progress < 1) return;
    const x = WARP.x + WARP.step * SHARED;
    words(scene, x, 26, 'the shared end', { anchor: 'middle', patch: true, size: 17 });
    pointer(scene, { x, y: 32 }, { x, y: 44 });
  },
};
