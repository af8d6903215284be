/** The spacer card: woven in like a broad row, pushed down to the nails, with the spacing row twined along its upper edge. */
import { num } from '#core/craft/cloth/markup.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { twinedRuns } from '#core/craft/figures/kit/lay-runs.ts';
import { handWay, measure, nail, wood, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { eased, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { CARD, flat } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { CARD_ROW, onFace, tabbyRow } from '#core/craft/interlacement/lay.ts';

const WARP: WarpLines = { x: 120, step: 40, count: 9, top: 10, bottom: 240 };
const CARD_HEIGHT = 76;
const LEFT = 88;
const WIDTH = 384;
const HIGH = 44;
const LOW = 152;

export const SPACER_CARD: Figure = {
  title: 'Spacer card and spacing row',
  height: 300,
  describe: ({ plan, units }) =>
    `A card ${lengthWords(plan.cut.spacerCard.widthMm, units, 'least')} long and ${lengthWords(plan.cut.spacerCard.heightMm, units, 'least')} high goes over one end and under the next, down to the lower nails. A twined row on its upper edge holds the ends evenly apart.`,
  steps: () => [
    { weight: 3, words: 'Slide the card in, over one end and under the next.' },
    { weight: 2, words: 'Push it down to the lower nails. The first row of cloth will go the other way about.' },
    { weight: 4, words: 'Twine one row along its upper edge: it holds the ends evenly apart.' },
  ],
  draw: (scene, input, progress) => {
    const [slide, push, twine] = stages(progress, [3, 2, 4] as const);
    const { spacerCard } = input.plan.cut;
    scene.add(LEVEL.ground, wood(0, 228, 560, 36));
    for (let i = 0; i < 5; i++) scene.add(LEVEL.ground + 1, nail(endX(WARP, i * 2), 240));
    layWarp(scene, WARP, warpColour(input));
    const x = LEFT + (1 - eased(slide)) * 460;
    const y = HIGH + (LOW - HIGH) * eased(push);
    layCard(scene, x, y);
    layTwining(scene, warpColour(input), twine);
    if (slide > 0 && slide < 1) handWay(scene, trail(540, HIGH - 18).to(480, HIGH - 18).points);
    if (push > 0 && push < 1) handWay(scene, trail(516, HIGH + 20).to(516, LOW).points);
    if (push >= 1) measure(scene, { x: 62, y: LOW }, { x: 62, y: LOW + CARD_HEIGHT }, lengthWords(spacerCard.heightMm, input.units, 'least'));
    if (twine >= 1) words(scene, 556, LOW - 26, 'spacing row', { anchor: 'end', quiet: true, size: 17 });
    if (push >= 1) measure(scene, { x: LEFT, y: 284 }, { x: LEFT + WIDTH, y: 284 }, lengthWords(spacerCard.widthMm, input.units, 'least'));
  },
};

function layCard(scene: Scene, x: number, y: number): void {
  scene.add(LEVEL.behind, flat(x, y, WIDTH, CARD_HEIGHT, CARD));
  /* The card is the row below the first: it lies on the other face at every end. */
  for (const { from } of onFace(tabbyRow({ first: 0, last: WARP.count - 1 }, CARD_ROW), 'front')) {
    const at = endX(WARP, from);
    if (at < x + 6 || at > x + WIDTH - 6) continue;
    scene.add(LEVEL.front, `<path d="M${num(at - 9)} ${num(y + 0.8)}h18v${num(CARD_HEIGHT - 1.6)}h-18z" fill="${CARD}"/><path class="draw-edge" d="M${num(at - 9)} ${num(y)}h18M${num(at - 9)} ${num(y + CARD_HEIGHT)}h18" stroke="#111e33" stroke-width="1.6"/>`);
  }
}

/** Two strands that cross between every two ends: each is in front where the other is behind. */
function layTwining(scene: Scene, colour: string, share: number): void {
  const y = LOW - 7;
  for (const runs of twinedRuns(WARP, y, 3)) layStrand(scene, { colour, width: 4.4, runs: runs.map((run) => ({ ...run, level: run.level + 1 })) }, share);
}
