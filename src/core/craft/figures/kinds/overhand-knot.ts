/** The overhand knot: a ring of both ends together, their tips through it, pushed up to the cloth before it closes. */
import { shade } from '#core/craft/cloth/colour.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { handWay, words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { stages } from '#core/craft/figures/kit/stages.ts';
import { layStrand, toPath, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { bandOf, roleColour } from '#core/craft/figures/yarns.ts';

const MIDDLE = 280;
const EDGE_Y = 82;
const THICK = 11;

export const OVERHAND_KNOT: Figure = {
  title: 'Overhand knot',
  height: 316,
  describe: () => 'Both ends together make a ring; their tips go through it. Before it closes the knot is pushed up against the cloth, and only then drawn tight.',
  steps: () => [
    { weight: 4, words: 'Both ends together make a ring, and their tips go through it.' },
    { weight: 1, words: 'Push the ring up against the cloth, and only then draw it tight.' },
  ],
  draw: (scene, input, progress) => {
    const [ring, push] = stages(progress, [4, 1] as const);
    const warp = warpColour(input);
    const rows: WarpLines = { x: 120, step: 40, count: 9, top: 8, bottom: EDGE_Y };
    layField(scene, rows, { colour: roleColour(input, bandOf(input, 'tabby')?.yarn, '#2f5366'), width: 13, bottom: EDGE_Y - 8, pitch: 17.5, rows: 4, first: 0, last: 8, out: 26 });
    const runs = knotRuns();
    layStrand(scene, { colour: warp, width: THICK, runs }, ring);
    if (ring >= 1) for (const run of runs) scene.add(run.level + 0.5, `<path d="${toPath(run.points)}" stroke="${shade(warp, 0.45)}" stroke-width="1.2"/>`);
    if (push > 0) {
      handWay(scene, trail(396, 212).bend(400, 150, 352, 112).points, push);
      words(scene, 410, 170, 'push it up', { size: 17 });
      words(scene, 410, 190, 'before it closes', { size: 17 });
    }
    words(scene, 204, 300, 'two ends, taken as one', { anchor: 'end', quiet: true, size: 17 });
  },
};

/** Along the cord its crossings go under, over, under, over, under, over. */
function knotRuns(): Run[] {
  return [
    { level: LEVEL.front, points: trail(MIDDLE, EDGE_Y - 4).to(MIDDLE, 140).curve(MIDDLE, 172, 346, 156, 346, 198).curve(346, 240, 300, 252, 276, 246).points },
    { level: LEVEL.front, points: trail(276, 246).curve(228, 238, 214, 196, 234, 166).points },
    { level: LEVEL.above, points: trail(234, 166).curve(246, 146, 286, 136, 310, 142).points },
    { level: LEVEL.warp, points: trail(310, 142).curve(330, 148, 312, 168, 304, 186).points },
    { level: LEVEL.warp + 5, points: trail(304, 186).to(296, 216).points },
    { level: LEVEL.above, points: trail(296, 216).curve(290, 240, 288, 262, 290, 300).points },
  ];
}
