/** Fringe knots: ends in fours, each bundle knotted against the cloth, then all cut to one length. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { guide, words } from '#core/craft/figures/kit/marks.ts';
import { stageOf, stages } from '#core/craft/figures/kit/stages.ts';
import { tube } from '#core/craft/figures/kit/strand.ts';
import { cutMark } from '#core/craft/figures/kit/tools.ts';
import { toPath } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, warpColour, WARP_WIDTH, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 66, step: 39, count: 12, top: 8, bottom: 96 };
const EDGE_Y = 88;
const KNOT_Y = 124;
const CUT_Y = 236;
const IN_KNOT = 4;
const KNOTS = WARP.count / IN_KNOT;

export const FRINGE_KNOT: Figure = {
  title: 'Fringe knots',
  height: 284,
  describe: () => 'Four ends at a time are taken together and knotted close against the cloth. When all are knotted the fringe is cut to one length.',
  steps: () => [
    ...Array.from({ length: KNOTS }, (_, knot) => ({ weight: 2, words: knot === 0 ? 'Take four ends together, make a ring, draw their tips through, and push the knot up to the cloth before it closes.' : 'The next four ends in the same way.' })),
    { weight: 1, words: 'Comb the fringe straight and cut it to one length.' },
  ],
  draw: (scene, input, progress) => {
    const [knots, trim] = stages(progress, [2 * KNOTS, 1] as const);
    const colour = warpColour(input);
    layField(scene, WARP, { colour: techniqueColour(input, 'tabby'), width: 13, bottom: EDGE_Y - 8, pitch: 17.5, rows: 5, first: 0, last: 11, out: 22 });
    for (let knot = 0; knot < KNOTS; knot++) layBundle(scene, knot, colour, stageOf(knots, knot, KNOTS), trim);
    if (knots >= 1) guide(scene, `M30 ${CUT_Y}H530`);
    if (trim > 0 && trim < 1) cutMark(scene, 40 + trim * 480, CUT_Y);
    if (progress >= 1) words(scene, 280, 268, 'one length', { anchor: 'middle', quiet: true, size: 17 });
  },
};

/** @param closed how far the knot has been pushed up  @param trim how far the cut has come */
function layBundle(scene: Scene, knot: number, colour: string, closed: number, trim: number): void {
  const first = knot * IN_KNOT;
  const middle = endX(WARP, first + (IN_KNOT - 1) / 2);
  const knotY = KNOT_Y + 60 * (1 - closed);
  for (let i = 0; i < IN_KNOT; i++) {
    const [x, place] = [endX(WARP, first + i), i - (IN_KNOT - 1) / 2];
    const isCut = trim * 480 + 40 > x;
    const foot = isCut ? CUT_Y : CUT_Y + 14 + ((first + i) % 3) * 6;
    const way = trail(x, 8).to(x, EDGE_Y);
    if (closed > 0) way.bend(x, knotY - 14, middle + place * 4, knotY).bend(middle + place * 6, knotY + 40, middle + place * 13, foot);
    else way.to(x, foot);
    scene.add(LEVEL.warp, tube(toPath(way.points), colour, WARP_WIDTH, ' stroke-linecap="round"'));
  }
  if (closed > 0) scene.add(LEVEL.front, tube(`M${middle - 10} ${knotY + 3}q10 7 20-6`, colour, 9, ' stroke-linecap="round"'));
}
