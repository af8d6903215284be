/** The lark's head: the fold laid over the rod to the front, both halves brought forward under the rod and down through it. */
import { handWay, wood, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { eased, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { cordColours, THICK, type KnotFigure } from '#core/craft/macrame/figures/cord.ts';

const ROD = { top: 62, high: 34 } as const;
const [LEFT, RIGHT] = [252, 308];
/** Where the fold hangs before it is drawn close, and after. */
const [LOOSE, CLOSE] = [232, 140];

export const LARKS_HEAD: KnotFigure = {
  title: 'Lark’s head',
  height: 330,
  describe: ({ plan, units }) => {
    const [first] = plan.columns;
    const cut = first === undefined ? '' : ` Here each cord is cut to ${lengthWords(first.cutMm, units, 'cut')} and folded in its middle.`;
    return `The fold is laid over the rod from behind, so that it hangs down in front. Both halves come forward under the rod and go down through the fold; drawn close, they lie over its bar, which holds them to the rod.${cut}`;
  },
  steps: () => [
    { weight: 2, words: 'Lay the fold over the rod from behind, so that it hangs down in front.' },
    { weight: 3, words: 'Bring both halves forward under the rod, and down through the fold.' },
    { weight: 2, words: 'Draw both down until the bar lies close.' },
  ],
  draw: (scene, input, progress) => {
    const [laid, through, close] = stages(progress, [2, 3, 2] as const);
    const { working } = cordColours(input);
    const bar = LOOSE + (CLOSE - LOOSE) * eased(close);
    scene.add(LEVEL.warp, wood(40, ROD.top, 480, ROD.high));
    const fold = trail(LEFT, ROD.top - 8).to(LEFT, bar - 26).curve(LEFT, bar + 6, RIGHT, bar + 6, RIGHT, bar - 26).to(RIGHT, ROD.top - 8);
    layStrand(scene, { colour: working, width: THICK, runs: [{ level: LEVEL.above, points: fold.points }] }, laid);
    /* Through the fold is over its bar: behind it they would only hang there, and slip off. */
    for (const x of [LEFT + 14, RIGHT - 14]) {
      layStrand(scene, { colour: working, width: THICK, runs: [{ level: LEVEL.behind, points: trail(x, ROD.top - 6).to(x, ROD.top + ROD.high + 14).points }, { level: LEVEL.above + 1, points: trail(x, ROD.top + ROD.high + 14).to(x, 320).points }] }, laid < 1 ? laid * 0.3 : 0.3 + 0.7 * through);
    }
    if (through > 0 && through < 1) handWay(scene, trail(380, 128).bend(352, 190, 372, 250).points, through);
    if (progress >= 1) handWay(scene, trail(350, 200).to(350, 300).points);
    words(scene, 500, 54, 'the rod', { anchor: 'end', quiet: true, size: 17 });
    if (laid >= 1) words(scene, 236, bar + 4, 'the fold', { anchor: 'end', size: 17 });
    if (through >= 1) words(scene, 366, 290, 'both halves', { size: 17 });
  },
};
