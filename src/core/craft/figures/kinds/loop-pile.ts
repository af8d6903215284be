/** Loop pile: a row of tabby whose stretches on the face are drawn up to loops, and a plain row that holds them. */
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { measureBeside } from '#core/craft/figures/kit/marks.ts';
import { layField, rowRuns } from '#core/craft/figures/kit/rows.ts';
import { layRuns } from '#core/craft/figures/kit/lay-runs.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { bandOf, techniqueColour } from '#core/craft/figures/yarns.ts';
import { loopRow, onFace, tabbyRow } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 72, step: 46, count: 10, top: 8, bottom: 262 };
const ENDS = { first: 0, last: WARP.count - 1 };
const ROW = 4;
const Y = 158;
const HANG = 54;
const WIDTH = 12;

export const LOOP_PILE: Figure = {
  title: 'Loop pile',
  height: 272,
  describe: (input) => `A row of tabby is laid loosely. Where it lies over an end it is drawn up ${way(input)}, but not at the selvedges. A plain row above holds the loops.`,
  steps: (input) => [
    { weight: 3, words: 'Lay a row of tabby, loosely.' },
    { weight: 4, words: `Draw every stretch that lies in front up ${way(input)}, one after another from the side where the row began.` },
    { weight: 3, words: 'Weave a plain row back and beat it: it holds the loops.' },
  ],
  draw: (scene, input, progress) => {
    const [row, draw, hold] = stages(progress, [3, 4, 3] as const);
    const colour = techniqueColour(input, 'loop-pile');
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: techniqueColour(input, 'tabby'), width: 12.5, bottom: 240, pitch: 18, rows: ROW, first: 0, last: 9, out: 18 });
    const loops = onFace(loopRow(ENDS, ROW), 'front').filter((pass) => pass.raised === 'loop');
    const upTo = draw * loops.length;
    const hangOf = (end: number): number => Math.max(0, Math.min(1, upTo - loops.findIndex((pass) => pass.from === end))) * HANG;
    const tip = layStrand(scene, { colour, width: WIDTH, runs: layRuns(WARP, { lay: loopRow(ENDS, ROW), y: Y, out: 18 }) }, row);
    for (const pass of loops.filter(({ from }) => row >= 1 && hangOf(from) > 4)) layStrand(scene, { colour, width: WIDTH, runs: [loop(endX(WARP, pass.from), hangOf(pass.from))] });
    const back = layStrand(scene, { colour: techniqueColour(input, 'tabby'), width: 12.5, runs: rowRuns(WARP, [{ lay: tabbyRow(ENDS, ROW + 1), y: Y - 18, out: 18 }]) }, hold);
    if (row < 1) needleAt(scene, tip);
    if (hold > 0 && hold < 1) needleAt(scene, back);
    if (progress >= 1) measureBeside(scene, { x: 524, y: Y }, { x: 524, y: Y + HANG }, loopWords(input), { x: 552, y: Y - 30 }, 'end');
  },
};

function way(input: FigureInput): string {
  const band = bandOf(input, 'loop-pile');
  return band?.rodMm === undefined ? `to a loop of ${loopWords(input)}` : `over a rod ${lengthWords(band.rodMm, input.units, 'fine')} thick`;
}

/** Loops of a piece without any are shown at a common height; over a rod they come out about half its way round. */
function loopWords(input: FigureInput): string {
  const band = bandOf(input, 'loop-pile');
  const mm = band === undefined ? 12 : (band.loopMm ?? (Math.PI * band.rodMm) / 2);
  return lengthWords(mm, input.units, 'fine');
}

function loop(x: number, hang: number): Run {
  const half = WARP.step * 0.36;
  return { level: LEVEL.above, points: trail(x - half, Y).curve(x - half * 1.3, Y + hang * 1.3, x + half * 1.3, Y + hang * 1.3, x + half, Y).points };
}
