/** Soumak: forward over some ends, back under fewer, each stitch leaning like the one before; the row back leans the other way. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { layRuns } from '#core/craft/figures/kit/lay-runs.ts';
import { measure, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { countWords } from '#core/craft/figures/length-words.ts';
import { bandOf, roleColour, techniqueColour } from '#core/craft/figures/yarns.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';
import { soumakRow } from '#core/craft/interlacement/lay.ts';

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
  steps: (input) => {
    const { over, back } = stitchOf(input);
    return [
      { weight: 2, words: `To the right: ${repeatWords(soumakRow(endsOf(over, back), over, back))}, and out above the thread.` },
      { weight: 1, words: `Back to the left in the same stitch, ${repeatWords(soumakRow(endsOf(over, back), over, back, 'left'))}. It leans the other way.` },
    ];
  },
  draw: (scene, input, progress) => {
    const { over, back } = stitchOf(input);
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: roleColour(input, bandOf(input, 'soumak')?.tabbyYarn, '#93a8a6'), width: 12.5, bottom: 246, pitch: 17, rows: 4, first: 0, last: 12, out: 18 });
    const colour = techniqueColour(input, 'soumak');
    const runs = plaitRuns(over, back).map((run) => (run.level === LEVEL.behind ? { ...run, colour: shade(colour, 0.45) } : run));
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

/** As many ends as whole stitches take. */
function endsOf(over: number, back: number): { first: number; last: number } {
  const step = over - back;
  return { first: 0, last: over - 1 + step * Math.floor((WARP.count - over) / step) };
}

/** Two thirds of the row back: enough to see that it leans the other way. */
const STITCHES_BACK = 3;

function plaitRuns(over: number, back: number): Run[] {
  const ends = endsOf(over, back);
  const right = layRuns(WARP, { lay: soumakRow(ends, over, back), y: FIRST_ROW, lean: LEAN, out: WARP.step / 2 });
  const left = layRuns(WARP, { lay: soumakRow(ends, over, back, 'left').slice(0, 2 * STITCHES_BACK), y: SECOND_ROW, lean: LEAN, out: WARP.step / 2 });
  const edge = endX(WARP, ends.last);
  const up = trail(edge + 8, FIRST_ROW - LEAN).curve(edge + 30, FIRST_ROW - 14, edge + 30, SECOND_ROW - LEAN, edge + WARP.step / 2, SECOND_ROW - LEAN).points;
  return [...right, { level: LEVEL.behind, points: up }, ...left];
}
