/** A slit sewn from the back: to and fro through the turns of both colours, like the lace of a shoe. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 64, step: 52, count: 9, top: 8, bottom: 262 };
const PITCH = 20;
const ROWS = 10;
const BOTTOM = 246;
const [LEFT, RIGHT] = [{ first: 0, last: 3 }, { first: 8, last: 4 }];
/** Both colours turn at the slit after every second row, at one height. */
const TURNS = ROWS / 2;
/** Where the thread goes down into a turn and comes out beyond it, from the last end of its colour. */
const [DOWN, OUT] = [0, 22];
const turnY = (turn: number): number => BOTTOM - (2 * turn + 0.5) * PITCH;

export const SEWN_SLIT: Figure = {
  title: 'Sewing a slit',
  height: 274,
  describe: () => 'Seen from the back. A fine strong thread goes through a turn of the one colour, across to the turn of the other at the same height, and up by two rows to the next pair, like the lace of a shoe.',
  steps: () => [
    { weight: 1, words: 'At the foot of the slit go through the outermost turn of the one colour, and across through that of the other.' },
    { weight: TURNS - 1, words: 'Up by two rows to the next pair, and so on to the top. Draw it just so far that both sides touch.' },
  ],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    layWarp(scene, WARP, warpColour(input));
    for (const [colour, ends] of [[first, LEFT], [ground, RIGHT]] as const) layField(scene, WARP, { colour, width: 13, bottom: BOTTOM, pitch: PITCH, rows: ROWS, ...ends, out: 4 });
    const tip = layStrand(scene, { colour: '#f4f0e2', width: 3.6, runs: laceRuns() }, progress);
    if (progress < 1) needleAt(scene, tip);
    words(scene, 548, 26, 'the back of the cloth', { anchor: 'end', patch: true, quiet: true, size: 17 });
  },
};

/** In front of the cloth between the sides, and behind each turn, where it goes through. */
function laceRuns(): Run[] {
  const [left, right] = [endX(WARP, LEFT.last), endX(WARP, RIGHT.last)];
  const runs: Run[] = [];
  for (let turn = 0; turn < TURNS; turn++) {
    const y = turnY(turn);
    const from = runs.at(-1)?.points.at(-1) ?? { x: left - 26, y: y + 26 };
    runs.push(
      { level: LEVEL.above, points: trail(from.x, from.y).to(left + DOWN, y).points },
      { level: LEVEL.behind - 1, points: trail(left + DOWN, y).to(left + OUT, y).points },
      { level: LEVEL.above, points: trail(left + OUT, y).to(right - OUT, y).points },
      { level: LEVEL.behind - 1, points: trail(right - OUT, y).to(right - DOWN, y).points },
    );
  }
  const last = runs.at(-1)?.points.at(-1) ?? { x: right, y: turnY(TURNS - 1) };
  runs.push({ level: LEVEL.above, points: trail(last.x, last.y).to(left, last.y - 34).points });
  return runs;
}
