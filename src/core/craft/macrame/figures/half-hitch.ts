/** A half hitch over a cord that is held across, and two of them beside each other. */
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, tube, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { cordColours, THICK, type KnotFigure, type KnotInput } from '#core/craft/macrame/figures/cord.ts';

const HELD = 150;

/** Down behind the held cord, up in front of it, over, and down behind again, out in front of its own turn. */
const TURN: readonly Run[] = [
  { level: LEVEL.behind, points: trail(268, 8).to(268, 196).points },
  { level: LEVEL.front, points: trail(268, 196).curve(268, 232, 216, 232, 216, 196).points },
  { level: LEVEL.above, points: trail(216, 196).to(216, 118).curve(216, 88, 242, 88, 242, 118).points },
  { level: LEVEL.behind, points: trail(242, 118).to(242, 190).points },
];
const OUT: readonly Run[] = [{ level: LEVEL.above, points: trail(242, 190).to(242, 306).points }];
/** Once more on the other side: the end comes out between the two turns. */
const SECOND: readonly Run[] = [
  { level: LEVEL.above, points: trail(242, 190).curve(242, 246, 330, 250, 330, 196).to(330, 118).curve(330, 88, 294, 88, 294, 118).points },
  { level: LEVEL.behind, points: trail(294, 118).to(294, 190).points },
  { level: LEVEL.above, points: trail(294, 190).to(294, 306).points },
];

function layHeld(scene: Scene, input: KnotInput): void {
  scene.add(LEVEL.warp, tube(`M40 ${HELD}H520`, cordColours(input).still, THICK));
  words(scene, 520, HELD - 16, 'held across', { anchor: 'end', quiet: true, size: 17 });
}

export const HALF_HITCH: KnotFigure = {
  title: 'Half hitch',
  height: 316,
  describe: () => 'One cord is held across, in front of the end that works. The end goes up in front of the held cord, over it and down behind, and comes out in front of its own turn.',
  steps: () => [{ weight: 1, words: 'Up in front of the held cord, over it, down behind, and out in front of its own turn.' }],
  draw: (scene, input, progress) => {
    const [turn] = stages(progress, [1] as const);
    layHeld(scene, input);
    layStrand(scene, { colour: cordColours(input).working, width: THICK, runs: [...TURN, ...OUT] }, 0.32 + 0.68 * turn);
    if (turn > 0 && turn < 1) handWay(scene, trail(184, 214).to(184, 92).bend(206, 58, 240, 70).points, turn);
    words(scene, 286, 30, 'the end that works', { size: 17 });
    if (progress >= 1) handWay(scene, trail(214, 250).to(214, 304).points);
  },
};

export const DOUBLE_HALF_HITCH: KnotFigure = {
  title: 'Double half hitch',
  height: 316,
  describe: ({ piece }) => `Two half hitches of one end over the cord that is held across, side by side, each drawn close before the next. ${piece.columns.some(({ sections }) => sections.some(({ technique }) => technique === 'half-hitches')) ? 'Tied with every end in turn' : 'Where every end ties one in turn'}, they make a rib.`,
  steps: () => [
    { weight: 3, words: 'One half hitch over the held cord, drawn close.' },
    { weight: 3, words: 'A second one beside it; the end comes out between the two.' },
  ],
  draw: (scene, input, progress) => {
    const [first, second] = stages(progress, [3, 3] as const);
    layHeld(scene, input);
    const runs = second > 0 ? [...TURN, ...SECOND] : TURN;
    layStrand(scene, { colour: cordColours(input).working, width: THICK, runs }, second > 0 ? 0.5 + 0.5 * second : 0.32 + 0.68 * first);
    if (first > 0 && first < 1) handWay(scene, trail(184, 214).to(184, 92).bend(206, 58, 240, 70).points, first);
    if (second > 0 && second < 1) handWay(scene, trail(364, 214).to(364, 92).bend(342, 58, 306, 70).points, second);
    if (first >= 1) words(scene, 176, 262, 'first', { anchor: 'end', size: 17 });
    if (second >= 1) words(scene, 350, 262, 'second', { size: 17 });
  },
};
