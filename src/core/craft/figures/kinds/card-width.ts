/** Cutting strands on a card: every turn, cut along one edge, becomes a strand twice as long as the card is wide. */
import { num } from '#core/craft/cloth/markup.ts';
import type { Figure, FigureInput } from '#core/craft/figures/figure.ts';
import { measure, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { eased, stages } from '#core/craft/figures/kit/stages.ts';
import { tube } from '#core/craft/figures/kit/strand.ts';
import { CARD, cutMark, flat } from '#core/craft/figures/kit/tools.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { bandOf, bandPlanOf, techniqueColour } from '#core/craft/figures/yarns.ts';

const TOP = 40;
const BOTTOM = 160;
const LEFT = 130;
const RIGHT = 470;
const TURNS = 16;

export const CARD_WIDTH: Figure = {
  title: 'Cutting strands on a card',
  height: 266,
  describe: (input) =>
    `Yarn is wound round a card ${lengthWords(cardMm(input), input.units, 'cut')} wide and cut along one edge. Every turn becomes one strand of ${lengthWords(cutMm(input), input.units, 'cut')}.`,
  steps: (input) => [
    { weight: 5, words: `Wind round and round a card ${lengthWords(cardMm(input), input.units, 'cut')} wide, side by side.` },
    { weight: 2, words: 'Cut along one edge, through every turn.' },
    { weight: 2, words: `Each turn opens to a strand of ${lengthWords(cutMm(input), input.units, 'cut')}.` },
  ],
  draw: (scene, input, progress) => {
    const [wind, cut, open] = stages(progress, [5, 2, 2] as const);
    const colour = techniqueColour(input, 'rya');
    scene.add(LEVEL.ground, flat(LEFT, TOP, RIGHT - LEFT, BOTTOM - TOP, CARD));
    const step = (RIGHT - LEFT - 30) / TURNS;
    let d = '';
    for (let i = 0; i < Math.round(TURNS * wind); i++) {
      const x = LEFT + 20 + i * step;
      const end = cut >= (i + 1) / TURNS ? BOTTOM - 3 : BOTTOM + 7;
      d += `M${num(x)} ${TOP - 7}L${num(x + 6)} ${end}`;
    }
    if (d !== '') scene.add(LEVEL.front, tube(d, colour, 9, ' stroke-linecap="round"'));
    if (cut > 0 && cut < 1) cutMark(scene, LEFT + 24 + cut * (RIGHT - LEFT - 40), BOTTOM + 6);
    measure(scene, { x: 84, y: TOP }, { x: 84, y: BOTTOM }, lengthWords(cardMm(input), input.units, 'cut'));
    if (wind >= 1) words(scene, 484, BOTTOM + 5, 'cut along', { size: 17 });
    if (wind >= 1) words(scene, 484, BOTTOM + 23, 'this edge', { size: 17 });
    if (open > 0) {
      const half = 8 + 190 * eased(open);
      scene.add(LEVEL.front, tube(`M${num(280 - half)} 208H${num(280 + half)}`, colour, 9, ' stroke-linecap="round"'));
      if (open >= 1) measure(scene, { x: 280 - half, y: 240 }, { x: 280 + half, y: 240 }, lengthWords(cutMm(input), input.units, 'cut'));
    }
  },
};

/** A cut strand of a piece without rya: shown at a common length. */
const COMMON_CUT_MM = 240;
const CARD_THICKNESS_MM = 2;

function cutMm(input: FigureInput): number {
  const found = bandPlanOf(input, 'rya')?.cutMm;
  const band = bandOf(input, 'rya');
  return Math.ceil((found ?? (band === undefined ? COMMON_CUT_MM : 2 * band.pileMm)) / 5) * 5;
}

function cardMm(input: FigureInput): number {
  return Math.ceil((cutMm(input) / 2 - CARD_THICKNESS_MM) / 5) * 5;
}
