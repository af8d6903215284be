/** Measuring a yarn without a label: snug wraps round a rule, counted over two inches and halved. */
import { num } from '#core/craft/cloth/markup.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { measure, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { tube } from '#core/craft/figures/kit/strand.ts';
import { flat } from '#core/craft/figures/kit/tools.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const LEFT = 120;
const WRAPS = 24;
const STEP = 12;
const TOP = 76;
const BOTTOM = 150;

export const MEASURE_WRAPS: Figure = {
  title: 'Wraps in an inch',
  height: 220,
  describe: () => 'The yarn is wrapped round a rule, side by side, snug and not stretched, for two inches. Half the number of turns is the wraps in an inch.',
  steps: () => [{ weight: 1, words: 'Wrap the yarn round a rule, side by side, snug and not stretched, over two inches. Count the turns and halve them.' }],
  draw: (scene, input, progress) => {
    const colour = techniqueColour(input, 'tabby');
    scene.add(LEVEL.ground, flat(20, TOP, 520, BOTTOM - TOP, '#efe8d2'));
    let ticks = '';
    for (let x = LEFT, tick = 0; x < 530; x += WRAPS * STEP / 16, tick++) ticks += `M${num(x)} ${BOTTOM}v${tick % 8 === 0 ? -18 : tick % 4 === 0 ? -12 : -7}`;
    scene.add(LEVEL.ground + 1, `<path class="draw-edge" d="${ticks}" stroke="#111e33" stroke-width="1.2"/>`);
    const shown = Math.round(WRAPS * progress);
    let d = '';
    for (let i = 0; i < shown; i++) d += `M${num(LEFT + (i + 0.35) * STEP)} ${BOTTOM + 6}L${num(LEFT + (i + 0.75) * STEP)} ${TOP - 6}`;
    if (d !== '') scene.add(LEVEL.front, tube(d, colour, 8.8, ' stroke-linecap="round"'));
    measure(scene, { x: LEFT, y: 44 }, { x: LEFT + WRAPS * STEP, y: 44 }, '2 in');
    if (progress > 0) words(scene, LEFT + shown * STEP + 14, 118, `${shown} turns`, { patch: true });
    if (progress >= 1) words(scene, LEFT + (WRAPS * STEP) / 2, 202, `half of ${WRAPS}: ${WRAPS / 2} wraps in an inch`, { anchor: 'middle' });
  },
};
