/** The gathering knot: a loop laid along the bundle, turns over both from the top down, the end through the loop, the loop drawn under. */
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { eased, stageOf, stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, tube } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { lengthWords } from '#core/craft/figures/length-words.ts';
import { cordColours, THICK, type KnotFigure, type KnotInput } from '#core/craft/macrame/figures/cord.ts';

const TURNS = 6;
const TOP = 96;
const PITCH = 19;
const [LEFT, RIGHT] = [222, 338];

function ownCord({ plan }: KnotInput): number | undefined {
  return [...plan.foot, ...plan.columns.flatMap(({ sections }) => sections)].find(({ cordMm }) => cordMm !== undefined)?.cordMm;
}

export const GATHERING_KNOT: KnotFigure = {
  title: 'Gathering knot',
  height: 336,
  describe: (input) => {
    const cordMm = ownCord(input);
    const cut = cordMm === undefined ? '' : ` Its own cord is cut to ${lengthWords(cordMm, input.units, 'cut')}.`;
    return `A loop of another cord is laid along the bundle, its fold downwards. The long end is turned round bundle and loop, from the top down, each turn close to the one before. Then it goes through the loop, and the short end above draws the loop under the turns.${cut}`;
  },
  steps: () => [
    { weight: 2, words: 'Lay a loop of the other cord along the bundle, its fold downwards.' },
    { weight: 5, words: 'Turn the long end round bundle and loop, from the top down, each turn close to the one before.' },
    { weight: 1, words: 'Put the long end through the loop.' },
    { weight: 2, words: 'Draw the short end above until the loop has gone under the turns.' },
  ],
  draw: (scene, input, progress) => {
    const [laid, turned, through, drawn] = stages(progress, [2, 5, 1, 2] as const);
    const { working, still } = cordColours(input);
    const bundle = [238, 259, 280, 301, 322];
    scene.add(LEVEL.warp, tube(bundle.map((x) => `M${x} 8V328`).join(''), still, THICK));
    const foot = TOP + TURNS * PITCH;
    const fold = foot + 44 - 62 * eased(drawn);
    const loop = trail(302, 14).to(302, fold - 14).curve(302, fold + 12, 262, fold + 12, 262, fold - 14).to(262, TOP - 6);
    layStrand(scene, { colour: working, width: THICK, runs: [{ level: LEVEL.front, points: loop.points }] }, laid);
    for (let turn = 0; turn < TURNS; turn++) {
      const share = stageOf(turned, turn, TURNS);
      if (share <= 0) break;
      const y = TOP + turn * PITCH;
      layStrand(scene, { colour: working, width: THICK, runs: [{ level: LEVEL.above, points: trail(LEFT, y).bend((LEFT + RIGHT) / 2, y + 9, RIGHT, y + 5).points }] }, share);
    }
    if (through > 0) layStrand(scene, { colour: working, width: THICK, runs: [{ level: LEVEL.above + 1, points: trail(LEFT, foot - 4).curve(214, foot + 26, 252, foot + 22, 282, foot + 26 - 18 * eased(drawn)).points }] }, through);
    if (turned > 0 && turned < 1) handWay(scene, trail(366, TOP).bend(392, TOP + 40, 366, TOP + 84).points, turned);
    if (drawn > 0) handWay(scene, trail(356, 78).to(356, 22).points);
    words(scene, 372, 30, drawn > 0 ? 'draw here' : 'short end', { size: 17 });
    if (laid >= 1 && drawn < 1) words(scene, 206, foot + 50, 'fold of the loop', { anchor: 'end', quiet: true, size: 17 });
    if (turned >= 1) words(scene, 372, TOP + 60, 'turns, top down', { quiet: true, size: 17 });
  },
};
