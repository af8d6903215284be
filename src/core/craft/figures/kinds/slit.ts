/** A slit: two colours that turn on neighbouring ends leave an opening between them. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { measureBeside, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 64, step: 52, count: 9, top: 8, bottom: 250 };
const PITCH = 18;
const ROWS = 12;
const BOTTOM = 232;
/** A slit longer than this is sewn or joined. */
const SEW_FROM_MM = 15;

export const SLIT: Figure = {
  title: 'Slit',
  height: 262,
  describe: ({ units }) =>
    `Two colours turn on neighbouring ends, and a slit stays open between them. One longer than ${lengthWords(SEW_FROM_MM, units, 'fine')} is sewn from the back.`,
  steps: () => [{ weight: 1, words: 'Each colour turns on its own last end, row after row. The gap between them stays open.' }],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: first, width: 13, bottom: BOTTOM, pitch: PITCH, rows: ROWS, first: 0, last: 3, share: progress, out: 9 });
    layField(scene, WARP, { colour: ground, width: 13, bottom: BOTTOM, pitch: PITCH, rows: ROWS, first: 8, last: 4, share: progress, out: 9 });
    const x = WARP.x + WARP.step * 3.5;
    if (progress < 1) return;
    scene.add(LEVEL.marks, `<path class="draw-hand" d="M${x} ${BOTTOM + 8}V${BOTTOM - PITCH * (ROWS - 1) - 8}" stroke="#2b5283" stroke-width="2.6" stroke-dasharray=".1 7" stroke-linecap="round"/>`);
    measureBeside(scene, { x: x + 104, y: BOTTOM - 12 }, { x: x + 104, y: 66 }, `from ${lengthWords(SEW_FROM_MM, input.units, 'fine')}: sew it`, { x: x + 116, y: 152 });
    words(scene, x, 22, 'slit', { anchor: 'middle', patch: true });
  },
};
