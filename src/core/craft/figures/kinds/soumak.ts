/** Soumak: forward over some ends, back under fewer, each stitch leaning like the one before; the row back leans the other way. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { measure, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { countWords } from '#core/craft/figures/length-words.ts';
import { bandOf, roleColour, techniqueColour } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 52, step: 38, count: 13, top: 8, bottom: 262 };
const FIRST_ROW = 170;
const SECOND_ROW = 128;
/** How far a stitch rises from one end to the other, half of it on each side of the row. */
const LEAN = 11;

export const SOUMAK: Figure = {
  title: 'Soumak',
  height: 272,
  describe: (input) => {
    const { over, back } = stitchOf(input);
    return `The yarn goes forward over ${countWords(over, 'end', 'ends')} and back under ${back}, and comes out above itself. Each stitch leans like the one before it. On the way back the stitches lean the other way, and two rows make a plait.`;
  },
  draw: (scene, input, progress) => {
    const { over, back } = stitchOf(input);
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: roleColour(input, bandOf(input, 'soumak')?.tabbyYarn, '#93a8a6'), width: 12.5, bottom: 246, pitch: 17, rows: 4, first: 0, last: 12, out: 18 });
    const colour = techniqueColour(input, 'soumak');
    const runs = [...rowRight(over, back), ...rowLeft(over, back)].map((run) => (run.level === LEVEL.behind ? { ...run, colour: shade(colour, 0.45) } : run));
    const tip = layStrand(scene, { colour, width: 14, runs }, progress);
    if (progress < 1) needleAt(scene, tip);
    if (progress < 1) return;
    measure(scene, { x: endX(WARP, 0) - 14, y: 84 }, { x: endX(WARP, over - 1) + 14, y: 84 }, `over ${over}`);
    measure(scene, { x: endX(WARP, over - back) - 14, y: 44 }, { x: endX(WARP, over - 1) + 14, y: 44 }, `under ${back}`);
    words(scene, 548, 52, 'the row back leans the other way', { anchor: 'end', patch: true, quiet: true, size: 17 });
  },
};

function stitchOf(input: FigureInput): { over: number; back: number } {
  const band = bandOf(input, 'soumak');
  return { over: Math.min(6, band?.over ?? 4), back: Math.min(5, band?.back ?? 2) };
}

function rowRight(over: number, back: number): Run[] {
  const runs: Run[] = [];
  let start = 0;
  while (start + over <= WARP.count) {
    const a = endX(WARP, start) - WARP.step / 2;
    const b = endX(WARP, start + over - 1) + WARP.step / 2;
    runs.push({ level: LEVEL.front, points: trail(a, FIRST_ROW - LEAN).to(b, FIRST_ROW + LEAN).points });
    start += over - back;
    const c = endX(WARP, start) - WARP.step / 2;
    runs.push({ level: LEVEL.behind, points: trail(b, FIRST_ROW + LEAN).curve(b + 14, FIRST_ROW + LEAN, b + 10, FIRST_ROW - LEAN, b - 4, FIRST_ROW - LEAN).to(c, FIRST_ROW - LEAN).points });
  }
  return runs;
}

/** Two thirds of the row back: enough to see that it leans the other way. */
function rowLeft(over: number, back: number): Run[] {
  const runs: Run[] = [];
  let start = WARP.count - 1;
  const last = WARP.count - 1;
  runs.push({ level: LEVEL.behind, points: trail(endX(WARP, last) + 8, FIRST_ROW - LEAN).curve(endX(WARP, last) + 30, FIRST_ROW - 14, endX(WARP, last) + 30, SECOND_ROW - LEAN, endX(WARP, last) + WARP.step / 2, SECOND_ROW - LEAN).points });
  for (let stitch = 0; stitch < 3 && start - over >= -1; stitch++) {
    const a = endX(WARP, start) + WARP.step / 2;
    const b = endX(WARP, start - over + 1) - WARP.step / 2;
    runs.push({ level: LEVEL.front, points: trail(a, SECOND_ROW - LEAN).to(b, SECOND_ROW + LEAN).points });
    start -= over - back;
    const c = endX(WARP, start) + WARP.step / 2;
    runs.push({ level: LEVEL.behind, points: trail(b, SECOND_ROW + LEAN).curve(b - 14, SECOND_ROW + LEAN, b - 10, SECOND_ROW - LEAN, b + 4, SECOND_ROW - LEAN).to(c, SECOND_ROW - LEAN).points });
  }
  return runs;
}
