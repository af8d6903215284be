/** The shed stick seen from the side: flat it lies in the warp, on edge it lifts every second end and opens the shed. */
import { num } from '#core/craft/cloth/markup.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { handWay, pointer, wood, words } from '#core/craft/figures/kit/marks.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { eased, stages } from '#core/craft/figures/kit/stages.ts';
import { toPath, tube } from '#core/craft/figures/kit/strand.ts';
import { STICK, flat } from '#core/craft/figures/kit/tools.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { WARP_WIDTH, warpColour } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const Y = 138;
const STICK_X = 330;
const FELL_X = 132;

export const SHED_STICK: Figure = {
  title: 'Shed stick',
  height: 250,
  describe: () =>
    'Seen from the side. Flat, the stick lies in the warp. Turned on its edge it lifts every second end; the gap in front of it is the shed, and the weft goes through it in one movement.',
  steps: () => [
    { weight: 3, words: 'Turn the stick on its edge: every second end lifts.' },
    { weight: 2, words: 'Pass the weft through the open shed.' },
  ],
  draw: (scene, input, progress) => {
    const [turn, pass] = stages(progress, [3, 2] as const);
    const open = eased(turn);
    const lift = 7 + 31 * open;
    const warp = warpColour(input);
    scene.add(LEVEL.ground, wood(0, Y - 22, 44, 56) + wood(516, Y - 22, 44, 56));
    const upper = trail(44, Y).to(FELL_X, Y).to(STICK_X, Y - lift).to(516, Y);
    const lower = trail(44, Y).to(FELL_X, Y).to(STICK_X, Y + lift).to(516, Y);
    scene.add(LEVEL.warp, tube(toPath(lower.points), warp, WARP_WIDTH) + tube(toPath(upper.points), warp, WARP_WIDTH));
    scene.add(LEVEL.behind, `<g transform="translate(${STICK_X} ${Y}) rotate(${num(90 * open)})">${flat(-33, -5.5, 66, 11, STICK)}</g>`);
    for (let row = 0; row < 6; row++) scene.add(LEVEL.front, weftEnd(58 + row * 14, Y + (row % 2 === 0 ? -4 : 4), techniqueColour(input, 'tabby')));
    if (turn > 0 && turn < 1) handWay(scene, trail(STICK_X + 44, Y + 6).bend(STICK_X + 44, Y - 44, STICK_X + 2, Y - 54).points);
    if (pass > 0) scene.add(LEVEL.front, weftEnd(232 - 4 * pass, Y, techniqueColour(input, 'tabby'), 6 + 3 * pass));
    words(scene, 95, Y + 62, 'cloth', { anchor: 'middle' });
    if (turn >= 1) {
      pointer(scene, { x: 228, y: 56 }, { x: 236, y: Y - 12 });
      words(scene, 224, 46, 'shed: the weft goes through here', { anchor: 'middle' });
    }
    words(scene, STICK_X, Y + 84, open > 0.5 ? 'the stick, on edge' : 'the stick, lying flat', { anchor: 'middle' });
  },
};

/** The weft cut across. */
function weftEnd(x: number, y: number, colour: string, radius = 7.5): string {
  return `<circle class="draw-edge" cx="${num(x)}" cy="${num(y)}" r="${num(radius)}" fill="${colour}" stroke="#111e33" stroke-width="1.4"/>`;
}
