/** The finished piece on the wall: one cord from two points, the dowel level, a fixing that is strong enough. */
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { guide, pointer, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { lengthWords, massWords } from '#core/craft/figures/length-words.ts';

const WIDTH = 220;
const LEFT = 30;

export const HANGING: Figure = {
  title: 'Hanging',
  height: 370,
  describe: ({ plan, units }) => {
    const cord = plan.cut.cordMm === undefined ? 'One cord' : `One cord of ${lengthWords(plan.cut.cordMm, units, 'cut')}`;
    return `${cord} is tied near both ends of the dowel, and the dowel hangs level. The piece weighs about ${massWords(plan.massG, units)}; the fixing should hold at least ${massWords(plan.cut.fixingHoldsG, units)}.`;
  },
  steps: ({ plan, units }) => [{ weight: 1, words: `Tie the cord near both ends of the dowel and hang it level, from a fixing that holds ${massWords(plan.cut.fixingHoldsG, units)} or more.` }],
  draw: (scene, input, progress) => {
    const { plan, units } = input;
    const svg = drawCloth(clothPieceOf(input.piece, plan, ''), { id: `${scene.id}-hung`, as: 'hanging', width: WIDTH, decorative: true });
    scene.add(LEVEL.ground, `<svg x="${LEFT}" y="14" overflow="visible"${svg.slice(4)}`);
    scene.add(LEVEL.marks, `<circle cx="${LEFT + WIDTH / 2}" cy="16" r="5" fill="#36424c"/>`);
    guide(scene, `M8 35H${LEFT + WIDTH + 30}`);
    const lines: string[] = [];
    if (plan.cut.dowel !== undefined) lines.push(`dowel, ${lengthWords(plan.cut.dowel.lengthMm, units, 'size')}, level`);
    if (plan.cut.cordMm !== undefined) lines.push(`cord, ${lengthWords(plan.cut.cordMm, units, 'cut')} to cut`);
    lines.push(`the piece: about ${massWords(plan.massG, units)}`, `the fixing holds ${massWords(plan.cut.fixingHoldsG, units)} or more`, 'out of reach of small children');
    lines.slice(0, Math.max(1, Math.ceil(lines.length * progress))).forEach((line, index) => words(scene, 310, 76 + index * 34, line, { size: 17.5, quiet: index > 1 }));
    pointer(scene, { x: 302, y: 70 }, { x: LEFT + WIDTH + 2, y: 38 });
  },
};
