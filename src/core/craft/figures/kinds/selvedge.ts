/** Two edges: a turn that touches the last end, and one that draws it in. */
import type { Figure } from '#core/craft/figures/figure.ts';
import { guide, handWay, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { layStrand, toPath, tube, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { WARP_WIDTH, warpColour } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const ROWS = 9;
const PITCH = 17;
const BOTTOM = 196;
const ENDS = 5;
const STEP = 36;

export const SELVEDGE: Figure = {
  title: 'The turn at the edge',
  height: 270,
  describe: () =>
    'On the left a turn that touches the last end: the edge stays straight. On the right a tight turn: it draws the last end in, row by row, until the cloth has a waist.',
  steps: () => [{ weight: 1, words: 'On the left each turn touches the last end; on the right each turn is tight, and draws the edge in row by row.' }],
  draw: (scene, input, progress) => {
    const weft = techniqueColour(input, 'tabby');
    const warp = warpColour(input);
    layEdge(scene, 40, () => 0, weft, warp, progress);
    layEdge(scene, 330, (row) => Math.min(30, Math.max(0, row) * 4.2), weft, warp, progress);
    guide(scene, 'M484 14V216');
    if (progress >= 1) handWay(scene, trail(516, 70).to(466, 70).points);
    words(scene, 112, 246, 'It touches the last end', { anchor: 'middle' });
    words(scene, 402, 246, 'It draws the edge in', { anchor: 'middle' });
  },
};

/** @param pull how far the last end has been drawn in at a row, in pixels */
function layEdge(scene: Scene, left: number, pull: (row: number) => number, weft: string, warp: string, share: number): void {
  const at = (end: number, row: number): number => left + STEP * end - (pull(row * share) * end) / (ENDS - 1);
  const y = (row: number): number => BOTTOM - row * PITCH;
  for (let end = 0; end < ENDS; end++) {
    const way = trail(at(end, 0), 214);
    for (let row = 0; row < ROWS; row++) way.to(at(end, row), y(row));
    way.to(at(end, ROWS - 1), 14);
    scene.add(LEVEL.warp, tube(toPath(way.points), warp, WARP_WIDTH));
  }
  const runs: Run[] = [];
  for (let row = 0; row < ROWS; row++) {
    const ends = Array.from({ length: ENDS }, (_, end) => (row % 2 === 0 ? end : ENDS - 1 - end));
    const direction = row % 2 === 0 ? 1 : -1;
    for (const end of ends) {
      const a = at(end, row) - (direction * STEP) / 2;
      const b = at(end, row) + (direction * STEP) / 2;
      const edge = direction > 0 && end === ENDS - 1;
      const out = edge ? at(end, row) + 11 : b;
      const begin = direction < 0 && end === ENDS - 1 ? at(end, row) + 11 : a;
      runs.push({ level: (end + row) % 2 === 0 ? LEVEL.front : LEVEL.behind, points: trail(begin, y(row)).to(out, y(row)).points });
    }
    if (row + 1 < ROWS) {
      const x = row % 2 === 0 ? at(ENDS - 1, row) + 11 : at(0, row) - STEP / 2;
      const out = row % 2 === 0 ? 9 : -9;
      const next = row % 2 === 0 ? at(ENDS - 1, row + 1) + 11 : at(0, row + 1) - STEP / 2;
      if (row % 2 === 0) runs.push({ level: LEVEL.behind, points: trail(x, y(row)).curve(x + out, y(row), next + out, y(row + 1), next, y(row + 1)).points });
    }
  }
  layStrand(scene, { colour: weft, width: 12.5, runs }, share);
}
