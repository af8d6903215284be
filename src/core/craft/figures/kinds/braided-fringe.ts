/** Braided fringe: three groups of ends; by turns the outer one at the right and at the left goes over the middle. */
import { light, shade } from '#core/craft/cloth/colour.ts';
import type { Figure } from '#core/craft/figures/figure.ts';
import { words } from '#core/craft/figures/kit/marks.ts';
import { layField } from '#core/craft/figures/kit/rows.ts';
import { LEVEL } from '#core/craft/figures/kit/scene.ts';
import { layStrand, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';
import { endX, layWarp, warpColour, type WarpLines } from '#core/craft/figures/kit/warp.ts';
import { techniqueColour } from '#core/craft/figures/yarns.ts';

const WARP: WarpLines = { x: 112, step: 42, count: 9, top: 8, bottom: 92 };
const EDGE_Y = 84;
const MIDDLE = 280;
/** From one place in the braid to the next, and from one crossing to the next. */
const APART = 26;
const FALL = 26;
const CROSSINGS = 8;

export const BRAIDED_FRINGE: Figure = {
  title: 'Braided fringe',
  height: 336,
  describe: () => 'Three groups of ends. By turns the outer group at the right and the outer group at the left goes over the middle one and becomes the middle, drawn down evenly; the tip is knotted.',
  steps: () => Array.from({ length: CROSSINGS }, (_, crossing) => ({ weight: 1, words: CROSSING_WORDS[crossing] ?? 'And so on, by turns from the right and from the left.' })),
  draw: (scene, input, progress) => {
    const colour = warpColour(input);
    layWarp(scene, WARP, colour);
    layField(scene, WARP, { colour: techniqueColour(input, 'tabby'), width: 13, bottom: EDGE_Y - 8, pitch: 17.5, rows: 4, first: 0, last: 8, out: 22 });
    const colours = [shade(colour, 0.28), colour, light(colour, 0.4)];
    groupRuns(Math.round(progress * CROSSINGS)).forEach((runs, group) => { layStrand(scene, { colour: colours[group] ?? colour, width: 11, runs }); });
    if (progress >= 1) words(scene, MIDDLE + 84, 200, 'the outer one', { size: 17, quiet: true });
    if (progress >= 1) words(scene, MIDDLE + 84, 220, 'over the middle, by turns', { size: 17, quiet: true });
  },
};

const CROSSING_WORDS = ['The group at the right goes over the middle one and becomes the middle.', 'The group at the left goes over the new middle and becomes the middle.'];

const placeX = (place: number): number => MIDDLE + (place - 1) * APART;

/** The ways of the three groups after so many crossings; what is not braided yet hangs straight. */
function groupRuns(crossings: number): Run[][] {
  const groups: Run[][] = [0, 1, 2].map((place) => {
    const x = endX(WARP, 3 + place);
    return [{ level: LEVEL.front, points: trail(x, EDGE_Y - 6).bend(x, EDGE_Y + 16, placeX(place), EDGE_Y + 30).points }];
  });
  let order: [number, number, number] = [0, 1, 2];
  for (let crossing = 0; crossing < crossings; crossing++) {
    const [left, middle, right] = order;
    const next: [number, number, number] = crossing % 2 === 0 ? [left, right, middle] : [middle, left, right];
    const over = crossing % 2 === 0 ? right : left;
    const y = EDGE_Y + 30 + crossing * FALL;
    for (const group of order) {
      const [from, to] = [placeX(order.indexOf(group)), placeX(next.indexOf(group))];
      groups[group]?.push({ level: group === over ? LEVEL.above : LEVEL.front, points: trail(from, y).curve(from, y + FALL * 0.5, to, y + FALL * 0.5, to, y + FALL).points });
    }
    order = next;
  }
  const foot = EDGE_Y + 30 + crossings * FALL;
  order.forEach((group, place) => { groups[group]?.push({ level: LEVEL.front, points: trail(placeX(place), foot).to(placeX(place), 330).points }); });
  return groups;
}
