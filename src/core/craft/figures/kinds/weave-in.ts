/** Running a tail in at the back: up beside one end, under four rows, and cut. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { cutMark, needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 76, step: 51, count: 9, top: 8, bottom: 256 };
const PITCH = 24;
const BOTTOM = 236;
const ROWS = 9;
/** Rows the tail passes under. */
const UNDER = 4;

export const WEAVE_IN: Figure = {
  title: 'Running in a tail',
  height: 268,
  describe: () => 'Seen from the back. The needle runs the tail up beside one end, under four rows, and comes out; the tail is cut off there.',
  steps: () => [
    { weight: 4, words: 'At the back, run the tail up beside one end, under four rows, and out.' },
    { weight: 1, words: 'Cut it off there.' },
  ],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    const [run, cut] = stages(progress, [4, 1] as const);
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: ground, width: 15, bottom: BOTTOM, pitch: PITCH, rows: ROWS, first: 0, last: 8, out: 18 });
    const x = endX(WARP, 4) + 11;
    const runs: Run[] = [{ level: LEVEL.above, points: trail(x + 96, BOTTOM + 14).curve(x + 60, BOTTOM - 8, x + 6, BOTTOM + 2, x, BOTTOM - PITCH * 0.9).points }];
    const from = BOTTOM - PITCH * 0.9;
    const to = from - PITCH * (UNDER + 0.2);
    runs.push({ level: LEVEL.warp + 1, points: trail(x, from).to(x, to).points });
    runs.push({ level: LEVEL.above, points: trail(x, to).bend(x + 2, to - 18, x + 20, to - 28).points });
    const tip = layStrand(scene, { colour: first, width: 9, runs }, run);
    if (run < 1) needleAt(scene, tip);
    if (cut > 0) cutMark(scene, x + 22, to - 30);
    if (progress >= 1) words(scene, x + 44, to - 22, 'cut here', { patch: true, size: 17 });
    words(scene, 548, 24, 'the back of the cloth', { anchor: 'end', patch: true, quiet: true, size: 17 });
  },
};
