/** A new yarn takes over from the old: both lie in one shed for four ends, their tails at the back. */
import { light } from '#core/craft/cloth/colour.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { layRuns, type LaidRow } from '#core/craft/figures/kit/lay-runs.ts';
import { measureBeside, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';
import { tabbyRow, type Ends } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 66, step: 39, count: 12, top: 10, bottom: 236 };
const PITCH = 24;
const BOTTOM = 214;
const BELOW = 4;
/** The row of the join: the old yarn to its end 7, the new one from end 4 on, together over four. */
const OLD: Ends = { first: 0, last: 7 };
const NEW: Ends = { first: 4, last: 11 };
/** Half of what lies between the two where they lie together. */
const APART = 7;

export const JOIN_IN_ROW: Figure = {
  title: 'A new yarn',
  height: 250,
  describe: () => 'The old yarn ends inside the row, its tail at the back. The new one is laid into the same shed from four ends before that place, its tail at the back, and goes on. Over four ends both lie side by side.',
  steps: () => [
    { weight: 3, words: 'Let the old yarn end inside the row, its tail at the back.' },
    { weight: 4, words: 'Lay the new one into the same shed, from four ends before, and go on with it.' },
  ],
  draw: (scene, input, progress) => {
    const [old, next] = stages(progress, [3, 4] as const);
    const colour = techniqueColour(input, 'tabby');
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour, width: 15, bottom: BOTTOM, pitch: PITCH, rows: BELOW, first: 0, last: 11, out: 16 });
    layYarn(scene, colour, [...rowOf(OLD, APART), tail(endX(WARP, OLD.last) + 20, rowY + APART, 26)], old);
    layYarn(scene, fresh(input), [tail(endX(WARP, NEW.first) - 20, rowY - APART, -26, true), ...rowOf(NEW, -APART)], next);
    if (progress < 1) return;
    measureBeside(scene, { x: endX(WARP, NEW.first) - 8, y: rowY - 34 }, { x: endX(WARP, OLD.last) + 8, y: rowY - 34 }, 'four ends together', { x: 280, y: rowY - 48 }, 'middle');
    words(scene, endX(WARP, 0), rowY - 48, 'old', { size: 17 });
    words(scene, endX(WARP, 11), rowY - 48, 'new', { size: 17, anchor: 'end' });
  },
};

const rowY = BOTTOM - BELOW * PITCH - 8;

/** The same yarn in truth; here a little lighter, so that the two can be told apart. */
const fresh = (input: FigureInput): string => light(techniqueColour(input, 'tabby'), 0.3);

function rowOf(ends: Ends, below: number): Run[] {
  const row: LaidRow = { lay: tabbyRow(ends, BELOW, 'right'), y: rowY + below, out: 19 };
  return layRuns(WARP, row);
}

/** Hangs behind the cloth, out of sight where rows lie before it. */
function tail(x: number, y: number, aside: number, inwards = false): Run {
  const points = trail(x, y).bend(x + aside * 0.7, y, x + aside, y + 42).points;
  return { level: LEVEL.behind - 1, points: inwards ? [...points].reverse() : points };
}

function layYarn(scene: Scene, colour: string, runs: readonly Run[], share: number): void {
  const tip = layStrand(scene, { colour, width: 10, runs }, share);
  if (share > 0 && share < 1) needleAt(scene, tip);
}
