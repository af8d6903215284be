/** Wedges: what narrows as it rises is woven first; what widens fills the valley afterwards. */
import type { Figure } from '#core/craft/figures/figure.ts';
import type { LaidRow } from '#core/craft/figures/kit/lay-runs.ts';
import { numeral, words } from '#core/craft/figures/kit/marks.ts';
import { rowRuns } from '#core/craft/figures/kit/rows.ts';
import type { Scene } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { shapeColours } from '#core/craft/figures/yarns.ts';
import { tabbyRow } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 54, step: 37.5, count: 13, top: 8, bottom: 262 };
const PITCH = 16.5;
const BOTTOM = 244;

/** First and last end of the dune in each pass of two rows. */
const DUNE: readonly (readonly [number, number])[] = [[2, 10], [3, 10], [3, 9], [4, 9], [4, 8], [5, 8], [5, 7]];

export const WEDGE: Figure = {
  title: 'Wedge and valley',
  height: 272,
  describe: () =>
    'A dune is woven first, by itself. Every few rows it gives up one end, first at one side and then at the other, so its edges climb like stairs. The valleys beside it are filled afterwards.',
  steps: () => [
    { weight: 5, words: 'Weave the dune by itself. Every few rows turn one end earlier, first at one side, then at the other.' },
    { weight: 3, words: 'Fill the valley at its right.' },
    { weight: 2, words: 'Fill the valley at its left, up to the same height.' },
  ],
  draw: (scene, input, progress) => {
    const { ground, first } = shapeColours(input);
    const [dune, right, left] = stages(progress, [5, 3, 2] as const);
    layWarp(scene, WARP, warpColour(input));
    layPart(scene, first, DUNE.map(([from, to]) => [from, to] as const), dune);
    layPart(scene, ground, DUNE.map(([, to]) => [to + 1, 12] as const), right);
    layPart(scene, ground, DUNE.map(([from]) => [0, from - 1] as const), left);
    if (dune >= 1) numeral(scene, WARP.x + 6 * WARP.step, 188, 1);
    if (right >= 1) numeral(scene, WARP.x + 10.6 * WARP.step, 84, 2);
    if (left >= 1) numeral(scene, WARP.x + 1.4 * WARP.step, 84, 3);
    if (dune > 0 && dune < 1) words(scene, 280, 24, 'every few rows turn one end earlier', { anchor: 'middle', patch: true, size: 17 });
  },
};

function layPart(scene: Scene, colour: string, spans: readonly (readonly [number, number])[], share: number): void {
  const picks = spans.flatMap(([first, last], pass) =>
    [2 * pass, 2 * pass + 1].map((row): LaidRow => ({ lay: tabbyRow({ first, last }, row), y: BOTTOM - row * PITCH, out: 5 })));
  const tip = layStrand(scene, { colour, width: 12, runs: rowRuns(WARP, picks) }, share);
  if (share > 0 && share < 1) needleAt(scene, tip);
}
