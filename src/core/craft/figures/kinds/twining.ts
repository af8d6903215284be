/** Twining: two strands that change places in every gap, so that each end stands between them. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { words } from '#core/craft/figures/kit/marks.ts';
import { twinedRuns } from '#core/craft/figures/kit/lay-runs.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 96, step: 50, count: 9, top: 8, bottom: 222 };
const Y = 128;
const SWING = 9;

export const TWINING: Figure = {
  title: 'Twining',
  height: 240,
  describe: () => 'A strand folded in half goes round the first end. At every end one half lies in front and the other behind; in each gap they change places, always turning the same way. The ends are held apart.',
  steps: () => [
    { weight: 1, words: 'Fold the strand round the first end: one half lies in front of it, the other behind.' },
    { weight: 8, words: 'In each gap the front half goes behind and the back half comes to the front, always with the same turn, to the last end.' },
  ],
  draw: (scene, input, progress) => {
    const colour = techniqueColour(input, 'twining');
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: techniqueColour(input, 'tabby'), width: 12.5, bottom: 210, pitch: 18, rows: 3, first: 0, last: 8, out: 18 });
    const [front, behind] = twinedRuns(WARP, Y, SWING);
    const x = endX(WARP, 0) - WARP.step / 2;
    const fold = trail(x, Y - SWING).curve(x - 22, Y - SWING, x - 22, Y + SWING, x, Y + SWING).points;
    const share = Math.max(0.04, progress);
    const back = layStrand(scene, { colour: shade(colour, 0.2), width: 11, runs: behind }, share);
    const tip = layStrand(scene, { colour, width: 11, runs: [{ level: LEVEL.behind, points: fold }, ...front] }, share);
    if (progress < 1) for (const at of [back, tip]) needleAt(scene, at);
    if (progress >= 1) words(scene, 280, 40, 'the halves change places in every gap', { anchor: 'middle', patch: true, size: 17 });
  },
};
