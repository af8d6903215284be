/** The warp of a figure: evenly spaced ends that stand still while the weft moves. */
import { yarnColour } from '#core/craft/cloth/colour.ts';
import { num } from '#core/craft/cloth/markup.ts';
import type { FigureInput } from '#core/craft/figures/figure.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { tube } from '#core/craft/figures/kit/strand.ts';

export interface WarpLines {
  /** Left-most end. */
  readonly x: number;
  readonly step: number;
  readonly count: number;
  readonly top: number;
  readonly bottom: number;
}

export const WARP_WIDTH = 4.4;
export const PLAIN_WARP = '#e9e3d2';

export function endX(warp: WarpLines, index: number): number {
  return warp.x + warp.step * index;
}

export function layWarp(scene: Scene, warp: WarpLines, colour = PLAIN_WARP): void {
  let d = '';
  for (let i = 0; i < warp.count; i++) d += `M${num(endX(warp, i))} ${num(warp.top)}V${num(warp.bottom)}`;
  scene.add(LEVEL.warp, tube(d, colour, WARP_WIDTH));
}

export function warpColour(input: FigureInput): string {
  const colour = input.piece.warp.yarn.colour;
  return colour === undefined ? PLAIN_WARP : yarnColour(colour);
}
