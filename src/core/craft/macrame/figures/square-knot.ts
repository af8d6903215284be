/** The square knot: the left end over the middle two and under the right; the right behind and up through; then the same from the other side. */
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, tube, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail, type Point } from '#core/craft/figures/kit/trail.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { KNOT_TAKES, squareKnotCord } from '#core/craft/macrame/cord.ts';
import { cordColours, THICK, type KnotFigure, type KnotInput } from '#core/craft/macrame/figures/cord.ts';

const MIDDLE = 280;
const FILLERS = [264, 296] as const;
const HALF = 158;

/** The first half; the second is its mirror picture, one half lower. */
const OVER: readonly Run[] = [
  { level: LEVEL.front, points: trail(200, 8).to(200, 78).curve(200, 116, 232, 122, 280, 124).curve(332, 126, 386, 122, 360, 166).points },
];
const UNDER: readonly Run[] = [
  { level: LEVEL.above, points: trail(360, 8).to(360, 96).curve(360, 138, 352, 152, 338, 154).points },
  { level: LEVEL.behind, points: trail(338, 154).curve(300, 160, 250, 160, 226, 130).points },
  { level: LEVEL.above, points: trail(226, 130).curve(214, 108, 206, 88, 188, 88).curve(168, 88, 172, 130, 200, 166).points },
];

function placed(runs: readonly Run[], mirrored: boolean, down: number): Run[] {
  const move = ({ x, y }: Point): Point => ({ x: mirrored ? 2 * MIDDLE - x : x, y: y + down });
  return runs.map((run) => ({ ...run, points: run.points.map(move) }));
}

function layHalf(scene: Scene, colours: { readonly over: string; readonly under: string }, shares: readonly [number, number], mirrored: boolean): void {
  const down = mirrored ? HALF : 0;
  layStrand(scene, { colour: colours.over, width: THICK, runs: placed(OVER, mirrored, down) }, shares[0]);
  layStrand(scene, { colour: colours.under, width: THICK, runs: placed(UNDER, mirrored, down) }, shares[1]);
}

function takes({ piece }: KnotInput): { readonly cordMm: number; readonly riseMm: number } | undefined {
  const [cord] = Object.values(piece.yarns);
  if (cord === undefined || !('diameterMm' in cord)) return undefined;
  return {
    cordMm: squareKnotCord(cord.diameterMm, piece.takes?.squareKnot),
    riseMm: (piece.takes?.squareRise ?? KNOT_TAKES.squareRise) * cord.diameterMm,
  };
}

export const SQUARE_KNOT: KnotFigure = {
  title: 'Square knot',
  height: 336,
  describe: (input) => {
    const taken = takes(input);
    const amounts = taken === undefined ? '' : ` In this cord one knot takes about ${lengthWords(taken.cordMm, input.units, 'size')} of each working end and stands ${lengthWords(taken.riseMm, input.units, 'fine')} high.`;
    return `Four ends: the middle two hang still. The left end goes over them and under the right one; the right end goes behind them and up through the loop at the left. Then the same from the right, and both are drawn close.${amounts}`;
  },
  steps: () => [
    { weight: 3, words: 'The left end goes over the middle two and under the right one.' },
    { weight: 3, words: 'The right end goes behind the middle two and up through the loop at the left.' },
    { weight: 3, words: 'The same from the right: over the middle two, under the left one.' },
    { weight: 3, words: 'The left end goes behind and up through the loop at the right. Draw both close.' },
  ],
  draw: (scene, input, progress) => {
    const [first, second, third, fourth] = stages(progress, [3, 3, 3, 3] as const);
    const { working, other, still } = cordColours(input);
    scene.add(LEVEL.warp, tube(FILLERS.map((x) => `M${x} 8V328`).join(''), still, THICK));
    layHalf(scene, { over: working, under: other }, [first, second], false);
    if (second >= 1) layHalf(scene, { over: working, under: other }, [third, fourth], true);
    if (first > 0 && first < 1) handWay(scene, trail(170, 60).bend(170, 140, 250, 150).points, first);
    if (second > 0 && second < 1) handWay(scene, trail(392, 90).bend(392, 180, 300, 186).points, second);
    if (third > 0 && third < 1) handWay(scene, trail(392, 216).bend(392, 300, 310, 308).points, third);
    words(scene, 184, 28, 'left end', { anchor: 'end', size: 17 });
    words(scene, 376, 28, 'right end', { size: 17 });
    words(scene, 312, 28, 'still', { quiet: true, size: 15 });
    if (second >= 1) words(scene, 412, 128, 'first half', { quiet: true, size: 17 });
    if (fourth >= 1) words(scene, 412, 128 + HALF, 'and its mirror', { quiet: true, size: 17 });
  },
};
