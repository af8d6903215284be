/** Winding the warp: one thread round the nails of both rails, by zigzag or along two neighbouring nails. */
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { layoutOf } from '#core/craft/frame-loom/room.ts';
import { handWay, measureBeside, nail, wood, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { layStrand, toPath, tube } from '#core/craft/figures/kit/strand.ts';
import { Trail, trail } from '#core/craft/figures/kit/trail.ts';
import { WARP_WIDTH, warpColour } from '#core/craft/figures/kit/warp.ts';
import { countWords, lengthWords } from '#core/craft/figures/length-words.ts';

const NAILS = 7;
/** Nails wound when the movement is done; the rest show where it goes on. */
const WOUND = 5;
const X = 66;
const PITCH = 71;
const TOP = 40;
const BOTTOM = 232;
/** How far from a nail's middle the thread lies. */
const AROUND = 8.5;

const x = (index: number): number => X + PITCH * index;

export const WARPING: Figure = {
  title: 'Winding the warp',
  height: 306,
  describe: (input) => {
    const way = input.piece.loom.warping === 'zigzag' ? 'up round a nail, down round the next one below, and so on' : 'along two neighbouring nails, then across to the other rail';
    const { count, nailsTop, nailsBottom } = input.plan.ends;
    return `The warp runs ${way}, until ${countWords(count, 'end', 'ends')} stand on ${countWords(nailsTop, 'nail', 'nails')} above and ${nailsBottom} below, ${lengthWords(pitchMm(input), input.units, 'fine')} from nail to nail.`;
  },
  steps: (input) => [{ weight: 1, words: input.piece.loom.warping === 'zigzag' ? 'Tie to the first nail. Down round the nail below, up round the next one above, and so on.' : 'Tie to the first nail. Across to the other rail, along to the neighbouring nail, and back.' }],
  draw: (scene, input, progress) => {
    const colour = warpColour(input);
    const zigzag = input.piece.loom.warping === 'zigzag';
    scene.add(LEVEL.ground, wood(0, 14, 560, 38) + wood(0, 220, 560, 38));
    const wound = zigzag ? zigzagTrail(0, WOUND) : stepTrail(0, WOUND);
    const rest = zigzag ? zigzagTrail(WOUND, NAILS) : stepTrail(WOUND, NAILS);
    scene.add(LEVEL.behind, `<g opacity=".28">${tube(toPath(rest.points), colour, WARP_WIDTH)}</g>`);
    layKnot(scene, colour);
    layStrand(scene, { colour, width: WARP_WIDTH, runs: [{ level: LEVEL.warp, points: wound.points }] }, Math.max(0.02, progress));
    for (let i = 0; i < NAILS; i++) scene.add(LEVEL.ground + 1, nail(x(i), TOP) + nail(x(i), BOTTOM));
    const from = wound.points.at(-1);
    if (progress >= 1 && from !== undefined) handWay(scene, trail(from.x + 30, from.y + 22).to(from.x + 24, BOTTOM - 28).points);
    measureBeside(scene, { x: x(5), y: 272 }, { x: x(6), y: 272 }, `${lengthWords(pitchMm(input), input.units, 'fine')} from nail to nail`, { x: 560, y: 298 }, 'end');
    const { count, nailsTop, nailsBottom } = input.plan.ends;
    words(scene, 0, 288, `${countWords(count, 'end', 'ends')}: ${countWords(nailsTop, 'nail', 'nails')} above, ${nailsBottom} below`);
  },
};

function pitchMm(input: FigureInput): number {
  return layoutOf(input.piece.loom).pitchMm;
}

/** Two ends leave every nail but the first: down at its right, up at the left of the next. */
function zigzagTrail(from: number, to: number): Trail {
  const way = trail(x(from) - AROUND, TOP);
  for (let i = from; i < to; i++) {
    way.round(x(i), TOP, AROUND, 2, 4);
    way.round(x(i), BOTTOM, AROUND, 2, 0);
    if (i + 1 < NAILS) way.to(x(i + 1) - AROUND, TOP);
  }
  return way;
}

/** One end to each nail: down at one, along to its neighbour, up, along to the next. */
function stepTrail(from: number, to: number): Trail {
  const down = from % 2 === 0;
  const way = trail(x(from), down ? TOP : BOTTOM);
  for (let i = from; i < to; i++) {
    const [start, end] = i % 2 === 0 ? [TOP, BOTTOM] : [BOTTOM, TOP];
    way.to(x(i) + (i % 2 === 0 ? -1 : 1) * AROUND, start).to(x(i) - AROUND, end);
    if (i + 1 < NAILS) way.round(x(i), end, AROUND, 2, i % 2 === 0 ? 1 : 3).round(x(i + 1), end, AROUND, i % 2 === 0 ? 1 : 3, i % 2 === 0 ? 0 : 4);
  }
  return way;
}

function layKnot(scene: Scene, colour: string): void {
  const ring = new Trail(x(0) + AROUND, TOP).round(x(0), TOP, AROUND, 0, 4);
  scene.add(LEVEL.warp - 1, tube(toPath(ring.points), colour, WARP_WIDTH));
  scene.add(LEVEL.warp - 1, tube(toPath(trail(x(0) - 6, TOP + 7).bend(x(0) - 26, TOP + 16, x(0) - 30, TOP + 46).points), colour, WARP_WIDTH, ' stroke-linecap="round"'));
}
