/** The rya knot: laid over two ends, each half round the outside and up between them, then both drawn down. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { levelOf } from '#core/craft/figures/kit/lay-runs.ts';
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { eased, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { countWords, lengthWords } from '#core/craft/figures/length-words.ts';
import { bandOf, bandPlanOf, roleColour, techniqueColour } from '#core/craft/figures/yarns.ts';
import { ryaKnot } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 82, step: 66, count: 7, top: 8, bottom: 306 };
const FELL = 232;
/** Where a knot is laid and where it comes to rest. */
const HIGH = 96;
const REST = 206;
const BUNDLE = 15;

export const RYA_KNOT: Figure = {
  title: 'Rya knot',
  height: 316,
  describe: (input) => {
    const band = bandOf(input, 'rya');
    const cut = bandPlanOf(input, 'rya')?.cutMm;
    const strands = countWords(band?.strands ?? 3, 'strand', 'strands');
    const long = cut === undefined ? '' : `, each ${lengthWords(cut, input.units, 'cut')} long`;
    return `A bundle of ${strands}${long} is laid over two ends. Each half goes round the outside of its end, behind it, and up between the two. Both are drawn down until the knot sits on the cloth.`;
  },
  steps: () => [
    { weight: 2, words: 'Lay the bundle over two ends, both halves alike long.' },
    { weight: 3, words: 'Take the left half round the outside of its end, behind it, and up between the two.' },
    { weight: 3, words: 'Do the same with the right half. The bridge lies in front.' },
    { weight: 3, words: 'Draw both halves down until the knot sits on the cloth.' },
  ],
  draw: (scene, input, progress) => {
    const [laid, left, right, down] = stages(progress, [2, 3, 3, 3] as const);
    const foam = techniqueColour(input, 'rya');
    layWarp(scene, WARP, warpColour(input));
    const ground = roleColour(input, bandOf(input, 'tabby')?.yarn, '#2f5366');
    layField(scene, WARP, { colour: ground, width: 13, bottom: FELL + 60, pitch: 17.5, rows: 4, first: 0, last: 6, out: 24 });
    layKnot(scene, foam, 115, REST, 1, 1);
    layKnot(scene, foam, 247 + 132, HIGH + (REST - HIGH) * eased(down), left, right, laid);
    if (left > 0 && left < 1) handWay(scene, trail(300, 62).bend(268, 92, 300, 132).points);
    if (right > 0 && right < 1) handWay(scene, trail(458, 62).bend(490, 92, 458, 132).points);
    if (progress >= 1) handWay(scene, trail(500, 150).to(500, 236).points);
    if (laid >= 1 && down === 0) words(scene, 379, 40, 'the bridge lies in front', { anchor: 'middle', patch: true, size: 17 });
  },
};

/** @param middle between the two ends  @param laid how far the bundle has been laid across */
function layKnot(scene: Scene, colour: string, middle: number, y: number, left: number, right: number, laid = 1): void {
  const half = WARP.step / 2;
  const edge = shade(colour, 0.24);
  const parts: Run[] = [{ level: LEVEL.above + 2, points: trail(middle - half - 16, y).to(middle + half + 16, y).points }];
  if (laid < 1) {
    lay(scene, colour, edge, [{ level: LEVEL.front, points: trail(middle - 150, y).to(middle + 150, y).points }], laid);
    return;
  }
  lay(scene, colour, edge, halfRuns(middle, y, -1), left, y);
  lay(scene, colour, edge, halfRuns(middle, y, 1), right, y);
  lay(scene, colour, edge, parts, 1);
}

/** Behind the left end, in front of both, behind the right one: where each part of the knot lies. */
const FACES = ryaKnot(0, 1).map(({ face }) => levelOf(face)) as [number, number, number];

/** One half of the bundle: from the bridge out, behind the end, up through the middle and down over the cloth. */
function halfRuns(middle: number, y: number, side: -1 | 1): Run[] {
  const [left, bridge, right] = FACES;
  const leg = side < 0 ? left : right;
  const end = middle + (side * WARP.step) / 2;
  const tail = middle + side * 11;
  return [
    { level: bridge, points: trail(end + side * 10, y).bend(end + side * 30, y, end + side * 30, y + 12).points },
    { level: leg, points: trail(end + side * 30, y + 12).bend(end + side * 30, y + 24, end + side * 6, y + 22).to(middle + side * 15, y + 20).points },
    { level: LEVEL.above, points: trail(middle + side * 15, y + 20).bend(tail, y + 20, tail, y + 44).to(tail + side * 3, y + 98).points },
  ];
}

function lay(scene: Scene, colour: string, edge: string, runs: readonly Run[], share: number, bridgeY?: number): void {
  if (share <= 0.03 && bridgeY !== undefined) {
    const from = runs[0]?.points[0];
    if (from === undefined) return;
    const side = (runs[0]?.points.at(-1)?.x ?? 0) < from.x ? -1 : 1;
    layStrand(scene, { colour, width: BUNDLE, runs: [{ level: LEVEL.front - 1, points: trail(from.x, bridgeY).to(from.x + side * 106, bridgeY + 4).points }] });
    return;
  }
  layStrand(scene, { colour, width: BUNDLE, runs }, Math.max(share, 0.04));
  strandLines(scene, edge, runs, Math.max(share, 0.04));
}

/** Two fine lines along the bundle say that it is many strands. */
function strandLines(scene: Scene, edge: string, runs: readonly Run[], share: number): void {
  if (share < 1) return;
  for (const off of [-2.6, 2.6]) {
    const d = runs.map((run) => ({ level: run.level, d: run.points.map((p, i) => `${i === 0 ? 'M' : 'L'}${(p.x + off).toFixed(1)} ${(p.y + off * 0.4).toFixed(1)}`).join('') }));
    for (const part of d) scene.add(part.level + 0.5, `<path d="${part.d}" stroke="${edge}" stroke-width="1.1"/>`);
  }
}
