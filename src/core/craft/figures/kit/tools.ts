/** The few tools a figure shows: needle, flat stick, card, scissors' cut. */
import { num } from '#core/craft/cloth/markup.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import type { Tip } from '#core/craft/figures/kit/strand.ts';

/** A blunt needle at the tip of a thread that is on its way. */
export function needleAt(scene: Scene, tip: Tip | undefined): void {
  if (tip === undefined) return;
  const turn = (Math.atan2(tip.towards.y, tip.towards.x) * 180) / Math.PI;
  scene.add(
    tip.level + 1,
    `<g transform="translate(${num(tip.at.x)} ${num(tip.at.y)}) rotate(${num(turn)})">` +
      `<path class="draw-edge" d="M-2 0H34" stroke="#111e33" stroke-width="7.4" stroke-linecap="round"/>` +
      `<path d="M-2 0H34" stroke="#cbd1cf" stroke-width="4.6" stroke-linecap="round"/><path d="M1 0H9" stroke="#4a545f" stroke-width="1.6" stroke-linecap="round"/></g>`,
  );
}

/** A flat piece of wood or card seen from the front. */
export function flat(x: number, y: number, width: number, height: number, colour: string): string {
  return `<path class="draw-edge" d="M${num(x)} ${num(y)}h${num(width)}v${num(height)}h${num(-width)}z" fill="${colour}" stroke="#111e33" stroke-width="1.6" stroke-linejoin="round"/>`;
}

export const CARD = '#d9c79f';
export const STICK = '#c9b48a';

/** Where scissors cut: two short strokes that cross. */
export function cutMark(scene: Scene, x: number, y: number): void {
  scene.add(
    LEVEL.marks,
    `<path class="draw-hand" d="M${num(x - 6)} ${num(y - 6)}l12 12M${num(x + 6)} ${num(y - 6)}l-12 12" stroke="#2b5283" stroke-width="2.6" stroke-linecap="round"/>`,
  );
}
