/** Cutting off: loops at the lower nails are cut from the middle outwards, and knotted before the next is cut. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { nail, numeral, wood, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { stageOf } from '#core/craft/figures/kit/stages.ts';
import { toPath, tube } from '#core/craft/figures/kit/strand.ts';
import { cutMark } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { WARP_WIDTH, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { countWords } from '#core/craft/figures/length-words.ts';
import { bandOf, roleColour } from '#core/craft/figures/yarns.ts';

/** From the middle outwards, left and right in turn. */
const ORDER: readonly number[] = [3, 2, 4, 1, 5, 0, 6];
/** Loops cut when the movement is done; the next one is marked. */
const CUT = 5;
const X = 70;
const STEP = 70;
const EDGE_Y = 88;
const NAIL_Y = 232;
const PAIR = 14;

const x = (loop: number): number => X + STEP * loop;

export const CUTTING_OFF: Figure = {
  title: 'Cutting off',
  height: 290,
  describe: ({ plan }) =>
    `${countWords(plan.ends.nailsBottom, 'loop', 'loops')} hang on the lower nails. Cut the middle one close to its nail, knot its two ends against the cloth, then the next on the left, the next on the right, out to both edges.`,
  steps: () => ORDER.slice(0, CUT).map((_, place) => ({ weight: 1, words: place === 0 ? 'Cut the loop in the middle close to its nail, and knot its two ends against the cloth.' : `Then the next on the ${place % 2 === 1 ? 'left' : 'right'}: cut it, and knot it before you cut on.` })),
  draw: (scene, input, progress) => {
    const warp = warpColour(input);
    const rows: WarpLines = { x: x(0) - PAIR, step: STEP / 2, count: 13, top: 8, bottom: EDGE_Y };
    scene.add(LEVEL.ground, wood(0, 220, 560, 38));
    layField(scene, rows, { colour: roleColour(input, bandOf(input, 'tabby')?.yarn, '#2f5366'), width: 13, bottom: EDGE_Y - 8, pitch: 17.5, rows: 5, first: 0, last: 12, out: 26 });
    ORDER.forEach((loop, place) => {
      const done = place < CUT ? stageOf(progress, place, CUT) : 0;
      scene.add(LEVEL.ground + 1, nail(x(loop), NAIL_Y));
      if (done < 0.35) layLoop(scene, loop, warp);
      else layKnotted(scene, loop, warp, (done - 0.35) / 0.65);
      if ((done > 0 && done < 0.35) || (place === CUT && progress >= 1)) cutMark(scene, x(loop), NAIL_Y - 12);
      if (place < CUT && done >= 1) numeral(scene, x(loop), 196, place + 1);
    });
    if (progress >= 1) words(scene, 280, 280, 'knot before you cut on', { anchor: 'middle', size: 17 });
  },
};

function layLoop(scene: Scene, loop: number, colour: string): void {
  const way = trail(x(loop) - PAIR, 8).to(x(loop) - PAIR, EDGE_Y).to(x(loop) - 8.5, NAIL_Y).round(x(loop), NAIL_Y, 8.5, 2, 0).to(x(loop) + PAIR, EDGE_Y).to(x(loop) + PAIR, 8);
  scene.add(LEVEL.warp, tube(toPath(way.points), colour, WARP_WIDTH));
}

/** @param closed how far the knot has been pushed up to the cloth */
function layKnotted(scene: Scene, loop: number, colour: string, closed: number): void {
  const knotY = EDGE_Y + 16 + 46 * (1 - closed);
  for (const side of [-1, 1]) {
    const way = trail(x(loop) + side * PAIR, 8).to(x(loop) + side * PAIR, EDGE_Y).bend(x(loop) + side * PAIR, knotY - 8, x(loop) + side * 3, knotY).bend(x(loop) + side * 4, knotY + 30, x(loop) + side * 8, knotY + 66);
    scene.add(LEVEL.warp, tube(toPath(way.points), colour, WARP_WIDTH, ' stroke-linecap="round"'));
  }
  scene.add(LEVEL.front, tube(`M${x(loop) - 7} ${knotY + 3}q7 5 14-6`, colour, 7, ' stroke-linecap="round"'));
}
