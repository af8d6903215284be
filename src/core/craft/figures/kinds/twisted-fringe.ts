/** Twisted fringe: two groups of ends, each twisted one way, laid together the other way, and knotted. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { eased, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, toPath, tube, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail, type Point } from '#core/craft/figures/kit/trail.ts';
import { endX, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 112, step: 42, count: 9, top: 8, bottom: 92 };
const EDGE_Y = 84;
const FOOT = 268;
const MIDDLE = 280;
/** Half turns the two make about each other. */
const CROSSINGS = 7;
const SWING = 10;

export const TWISTED_FRINGE: Figure = {
  title: 'Twisted fringe',
  height: 312,
  describe: () => 'Two groups of ends are twisted, both to the right, until they kink. Laid together they are let go to the left about each other, and their tips are knotted.',
  steps: () => [
    { weight: 3, words: 'Take two groups of ends and twist both to the right, until they begin to kink.' },
    { weight: 4, words: 'Lay them together and let them turn to the left about each other. The two twists hold one another.' },
    { weight: 1, words: 'Knot the tips together.' },
  ],
  draw: (scene, input, progress) => {
    const [twist, together, knot] = stages(progress, [3, 4, 1] as const);
    const colour = warpColour(input);
    layField(scene, WARP, { colour: techniqueColour(input, 'tabby'), width: 13, bottom: EDGE_Y - 8, pitch: 17.5, rows: 4, first: 0, last: 8, out: 22 });
    for (const side of [-1, 1] as const) layGroup(scene, side, side < 0 ? colour : shade(colour, 0.12), twist, together);
    if (together === 0 && twist > 0) for (const side of [-1, 1]) handWay(scene, trail(MIDDLE + side * 74 - 26, 226).bend(MIDDLE + side * 74, 246, MIDDLE + side * 74 + 26, 226).points);
    if (together > 0 && together < 1) handWay(scene, trail(MIDDLE + 40, 244).bend(MIDDLE, 268, MIDDLE - 40, 244).points);
    if (knot > 0) scene.add(LEVEL.above, tube(`M${MIDDLE - 9} ${FOOT - 8}q9 7 18-6`, colour, 10, ' stroke-linecap="round"'));
    if (progress >= 1) words(scene, MIDDLE + 60, 200, 'each to the right,', { size: 17, quiet: true });
    if (progress >= 1) words(scene, MIDDLE + 60, 220, 'together to the left', { size: 17, quiet: true });
  },
};

function layGroup(scene: Scene, side: -1 | 1, colour: string, twist: number, together: number): void {
  const at = endX(WARP, 4 + side);
  const runs = groupRuns(side, at, eased(together));
  layStrand(scene, { colour, width: 11, runs });
  /* Slanted lines along the group say how far it is twisted. */
  for (const run of runs) for (const line of twistLines(run.points, twist)) scene.add(run.level + 0.5, `<path d="${toPath(line)}" stroke="${shade(colour, 0.45)}" stroke-width="1.3"/>`);
}

/** Hanging straight, or about each other: then each is in front in every second half turn. */
function groupRuns(side: -1 | 1, x: number, together: number): Run[] {
  const step = (FOOT - EDGE_Y - 26) / CROSSINGS;
  const apart = (1 - together) * (x + side * 30 - MIDDLE);
  const start: Run = { level: LEVEL.front, points: trail(x, EDGE_Y - 6).bend(x, EDGE_Y + 14, MIDDLE + apart + side * SWING * together, EDGE_Y + 26).points };
  const turns = Array.from({ length: CROSSINGS }, (_, turn): Run => {
    const from = side * SWING * together * (turn % 2 === 0 ? 1 : -1);
    const [y, next] = [EDGE_Y + 26 + turn * step, EDGE_Y + 26 + (turn + 1) * step];
    const inFront = (turn % 2 === 0) === (side < 0);
    return { level: inFront ? LEVEL.above : LEVEL.front, points: trail(MIDDLE + apart + from, y).curve(MIDDLE + apart + from, y + step * 0.4, MIDDLE + apart - from, next - step * 0.4, MIDDLE + apart - from, next).points };
  });
  return [start, ...turns];
}

function twistLines(points: readonly Point[], twist: number): Point[][] {
  const every = Math.max(2, Math.round(7 - 4 * twist));
  return points.filter((_, index) => index > 0 && index % every === 0).map(({ x, y }) => [{ x: x - 4.4, y: y - 3 * twist }, { x: x + 4.4, y: y + 3 * twist }]);
}
