/** Roving: a very thick weft that goes over and under several ends at once and is puffed up where it lies in front. */
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { levelOf } from '#core/craft/figures/kit/lay-runs.ts';
import { measureBeside, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { countWords, lengthWords } from '#core/craft/figures/length-words.ts';
import { bandOf, roleColour, techniqueColour } from '#core/craft/figures/yarns.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';
import { rovingRow } from '#core/craft/interlacement/lay.ts';

/** Twelve ends divide by every number of ends that is shown. */
const WARP: WarpLines = { x: 66, step: 39, count: 12, top: 8, bottom: 238 };
const Y = 140;
const THICK = 32;

export const ROVING: Figure = {
  title: 'Roving',
  height: 250,
  describe: (input) => {
    const { over, bulgeMm } = rovingOf(input);
    return `Unspun roving goes over ${countWords(over, 'end', 'ends')} and under ${over}, without pulling, and is puffed up to about ${lengthWords(bulgeMm, input.units, 'fine')} where it lies in front.`;
  },
  steps: (input) => [{ weight: 1, words: `Without pulling, ${repeatWords(rovingRow({ first: 0, last: WARP.count - 1 }, rovingOf(input).over))}; puff it up where it lies in front.` }],
  draw: (scene, input, progress) => {
    const { over, bulgeMm } = rovingOf(input);
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: roleColour(input, bandOf(input, 'tabby')?.yarn, '#93a8a6'), width: 12.5, bottom: 222, pitch: 17, rows: 3, first: 0, last: 11, out: 18 });
    layStrand(scene, { colour: techniqueColour(input, 'roving'), width: THICK, runs: rovingRuns(over) }, progress);
    if (progress < 1) return;
    words(scene, endX(WARP, (over - 1) / 2), 62, `over ${over}`, { anchor: 'middle', patch: true });
    words(scene, endX(WARP, over + (over - 1) / 2), 62, `under ${over}`, { anchor: 'middle', patch: true });
    const bulge = endX(WARP, over * 2 + (over - 1) / 2) + 8 + 20 * over;
    measureBeside(scene, { x: bulge, y: Y }, { x: bulge, y: Y - 38 }, lengthWords(bulgeMm, input.units, 'fine'), { x: bulge + 14, y: Y - 30 });
  },
};

function rovingOf(input: FigureInput): { over: number; bulgeMm: number } {
  const band = bandOf(input, 'roving');
  return { over: Math.max(2, Math.min(4, band?.over ?? 3)), bulgeMm: band?.bulgeMm ?? 12 };
}

function rovingRuns(over: number): Run[] {
  return rovingRow({ first: 0, last: WARP.count - 1 }, over).map((pass): Run => {
    const a = endX(WARP, pass.from) - WARP.step / 2;
    const b = endX(WARP, pass.to) + WARP.step / 2;
    return { level: levelOf(pass.face), points: bulge(a, b, pass.raised === 'puff' ? 38 : 0) };
  });
}

/** Level at both ends, so that it goes on smoothly behind the next ends. */
function bulge(a: number, b: number, lift: number): Run['points'] {
  const middle = (a + b) / 2;
  const soft = (b - a) * 0.26;
  return trail(a, Y).curve(a + soft, Y, a + soft * 0.9, Y - lift, middle, Y - lift).curve(b - soft * 0.9, Y - lift, b - soft, Y, b, Y).points;
}
