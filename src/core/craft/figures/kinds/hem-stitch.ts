/** Hem-stitch along the lower edge, from right to left: behind a bundle, round it, behind it again and up through the cloth. */
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { levelOf } from '#core/craft/figures/kit/lay-runs.ts';
import { numeral, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { needleAt } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { countWords } from '#core/craft/figures/length-words.ts';
import { bandOf, roleColour, techniqueColour } from '#core/craft/figures/yarns.ts';
import { repeatWords } from '#core/craft/interlacement/lay-words.ts';
import { hemStitch } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 70, step: 56, count: 8, top: 8, bottom: 216 };
const PITCH = 19;
/** The lowest row, and the line the stitches are made on. */
const EDGE_Y = 124;
const STITCH_Y = 164;
/** The stitching thread, told apart from rows in the same yarn. */
const THREAD_WIDTH = 8;

export const HEM_STITCH: Figure = {
  title: 'Hem-stitch',
  height: 262,
  describe: (input) => {
    const { ends, picks } = stitchOf(input);
    return `From right to left: behind ${countWords(ends, 'end', 'ends')}, back over the front of them, behind them again, and up through the cloth ${countWords(picks, 'row', 'rows')} above the edge.`;
  },
  steps: (input) => [firstMoves(input), 'The next bundle in the same three moves.', 'And so on to the left selvedge.'].map((words) => ({ words, weight: 1 })),
  draw: (scene, input, progress) => {
    const { picks } = stitchOf(input);
    layWarp(scene, WARP, warpColour(input));
    layField(scene, WARP, { colour: roleColour(input, groundRole(input), '#93a8a6'), width: 13.5, bottom: EDGE_Y, pitch: PITCH, rows: 6, first: 0, last: 7, out: 20 });
    const runs: Run[] = [{ level: LEVEL.above, points: trail(endX(WARP, 7) + 30, EDGE_Y - 30).bend(endX(WARP, 7) + 44, EDGE_Y + 20, endX(WARP, 7) + 26, STITCH_Y - 6).points }];
    for (let bundle = 0; bundle < 3; bundle++) runs.push(...bundleRuns(endX(WARP, 7 - 2 * bundle), endX(WARP, 6 - 2 * bundle), EDGE_Y - PITCH * (picks - 0.5)));
    const tip = layStrand(scene, { colour: techniqueColour(input, 'tabby') === techniqueColour(input, 'hem-stitch') ? '#e9e3d2' : techniqueColour(input, 'hem-stitch'), width: THREAD_WIDTH, runs }, progress);
    if (progress < 1) needleAt(scene, tip);
    if (progress >= 1) {
      numeral(scene, endX(WARP, 6) + 28, STITCH_Y - 22, 1);
      numeral(scene, endX(WARP, 6) + 28, STITCH_Y + 34, 2);
      numeral(scene, endX(WARP, 6) - 30, EDGE_Y - 64, 3);
      words(scene, 8, 252, '1 behind, 2 round, 3 behind and up', { quiet: true, size: 17 });
    }
  },
};

function stitchOf(input: FigureInput): { ends: number; picks: number } {
  const band = bandOf(input, 'hem-stitch');
  return { ends: band?.bundleEnds ?? 2, picks: band?.reachPicks ?? 2 };
}

function firstMoves(input: FigureInput): string {
  const { ends, picks } = stitchOf(input);
  const moves = repeatWords(hemStitch({ first: 0, last: ends - 1 }));
  return `From right to left, round ${countWords(ends, 'end', 'ends')}: ${moves}, and up through the cloth ${countWords(picks, 'row', 'rows')} above the edge.`;
}

/** The first tabby the edge belongs to. */
function groundRole(input: FigureInput): string | undefined {
  return bandOf(input, 'tabby')?.yarn;
}

/** Where the three moves of a stitch lie. */
const FACES = hemStitch({ first: 0, last: 1 }).map(({ face }) => levelOf(face)) as [number, number, number];

/** @param up where the thread comes out of the cloth */
function bundleRuns(right: number, left: number, up: number): Run[] {
  const before = right + 26;
  const after = left - 26;
  const [behind, round, again] = FACES;
  return [
    { level: behind, points: trail(before, STITCH_Y - 6).to(after + 6, STITCH_Y - 6).points },
    { level: round, points: trail(after + 6, STITCH_Y - 6).bend(after - 8, STITCH_Y + 2, after + 6, STITCH_Y + 10).to(right + 14, STITCH_Y + 10).points },
    { level: again, points: trail(right + 14, STITCH_Y + 10).bend(right + 26, STITCH_Y + 3, right + 8, STITCH_Y + 1).to(after + 12, STITCH_Y - 10).bend(after, STITCH_Y - 14, after, STITCH_Y - 34).to(after, up).points },
    { level: LEVEL.above, points: trail(after, up).bend(after - 12, up + 8, after - 6, up + 26).to(after - 2, STITCH_Y - 22).bend(after, STITCH_Y - 8, after - 4, STITCH_Y - 6).points },
  ];
}
