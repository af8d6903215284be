/** The warp of a figure: evenly spaced ends that stand still while the weft moves. */
import { yarnColour } from '#core/craft/cloth/colour.ts';
import { num } from '#core/craft/cloth/markup.ts';
import type { FigureInput } from '#core/craft/figures/figure.ts';
import { LEVEL, type Scene } from '#core/craft/figures/kit/scene.ts';
import { tube, type Run } from '#core/craft/figures/kit/strand.ts';
import { trail } from '#core/craft/figures/kit/trail.ts';

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

export interface Pick {
  readonly y: number;
  /** First and last end the row passes, in the order it is woven: from 9 to 0 runs to the left. */
  readonly from: number;
  readonly to: number;
  /** Whether the row goes over end 0, and so over every end with an even number. */
  readonly overEven: boolean;
  /** Ends taken as one. */
  readonly together?: number;
  /** How far the row stands out past its first and its last end. */
  readonly out?: number;
  /** Raises the row above `y`, for rows that are laid in hills. */
  readonly rise?: (x: number) => number;
}

/** The runs of one row of tabby. Between two ends the row changes sides half-way. */
export function pickRuns(warp: WarpLines, pick: Pick): Run[] {
  const { together = 1, out = warp.step * 0.5 } = pick;
  const direction = pick.to >= pick.from ? 1 : -1;
  const count = Math.abs(pick.to - pick.from) + 1;
  const half = warp.step / 2;
  const runs: Run[] = [];
  for (let i = 0; i < count; i += together) {
    const first = pick.from + direction * i;
    const last = first + direction * (Math.min(together, count - i) - 1);
    const a = endX(warp, first) - direction * (i === 0 ? out : half);
    const b = endX(warp, last) + direction * (i + together >= count ? out : half);
    const over = (Math.floor(Math.min(first, last) / together) % 2 === 0) === pick.overEven;
    runs.push({ level: over ? LEVEL.front : LEVEL.behind, points: stretch(a, b, pick) });
  }
  return runs;
}

function stretch(a: number, b: number, pick: Pick): Run['points'] {
  const { rise } = pick;
  if (rise === undefined) return trail(a, pick.y).to(b, pick.y).points;
  const steps = 6;
  return Array.from({ length: steps + 1 }, (_, step) => {
    const x = a + ((b - a) * step) / steps;
    return { x, y: pick.y - rise(x) };
  });
}
