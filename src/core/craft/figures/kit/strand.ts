/**
 * Threads as outlined double lines. A strand is a run of stretches at different levels, so that it can go under one end and
 * over the next, and it can stop anywhere along its way.
 */
import { num } from '#core/craft/cloth/markup.ts';
import type { Scene } from '#core/craft/figures/kit/scene.ts';
import { cutAt, heading, lengthOf, type Point } from '#core/craft/figures/kit/trail.ts';

export interface Run {
  readonly level: number;
  readonly points: readonly Point[];
  /** Of this stretch alone, where it lies in shadow. */
  readonly colour?: string;
}

export interface Strand {
  readonly colour: string;
  /** Of the coloured core; the outline adds {@link OUTLINE} on each side. */
  readonly width: number;
  readonly runs: readonly Run[];
}

export const OUTLINE = 1.4;
export const EDGE = '#111e33';

export interface Tip {
  readonly at: Point;
  readonly towards: Point;
  readonly level: number;
}

/** Lays the first `share` (0..1) of the strand into the scene, and says where it ends. */
export function layStrand(scene: Scene, strand: Strand, share = 1): Tip | undefined {
  const total = strand.runs.reduce((sum, run) => sum + lengthOf(run.points), 0);
  let left = total * share;
  let tip: Tip | undefined;
  const shown: Run[] = [];
  for (const run of strand.runs) {
    if (left <= 0.2) break;
    const points = cutAt(run.points, left);
    left -= lengthOf(run.points);
    shown.push({ ...run, points });
    const at = points.at(-1);
    if (at !== undefined) tip = { at, towards: heading(points), level: run.level };
  }
  const first = shown[0]?.points[0];
  if (first !== undefined) scene.add(shown[0]?.level ?? 0, cap(first, strand));
  if (tip !== undefined) scene.add(tip.level, cap(tip.at, strand));
  for (const run of shown) scene.add(run.level, stretch(run, strand));
  return tip;
}

/** Longer by a hair at both ends. */
function overlapped(points: readonly Point[]): Point[] {
  const [first, second] = points;
  const last = points.at(-1);
  if (first === undefined || second === undefined || last === undefined) return [...points];
  const back = heading([second, first]);
  const on = heading(points);
  return [{ x: first.x + back.x * HAIR, y: first.y + back.y * HAIR }, ...points.slice(1, -1), { x: last.x + on.x * HAIR, y: last.y + on.y * HAIR }];
}

const HAIR = 0.7;

/** The core is longer than its outline by a hair, so that no dark seam shows where two stretches meet. */
function stretch(run: Run, strand: Strand): string {
  return (
    `<path class="draw-edge" d="${toPath(run.points)}" stroke="${EDGE}" stroke-width="${num(strand.width + 2 * OUTLINE)}"/>` +
    `<path d="${toPath(overlapped(run.points))}" stroke="${run.colour ?? strand.colour}" stroke-width="${num(strand.width)}"/>`
  );
}

/** One or many lines given as path data, drawn as outlined thread. */
export function tube(d: string, colour: string, width: number, more = ''): string {
  return (
    `<path class="draw-edge" d="${d}" stroke="${EDGE}" stroke-width="${num(width + 2 * OUTLINE)}"${more}/>` +
    `<path d="${d}" stroke="${colour}" stroke-width="${num(width)}"${more}/>`
  );
}

/** The round end of a thread. Laid before its stretch, which covers the inner half. */
function cap(at: Point, strand: Strand): string {
  return tube(`M${num(at.x)} ${num(at.y)}h.01`, strand.colour, strand.width, ' stroke-linecap="round"');
}

export function toPath(points: readonly Point[]): string {
  return points.map((point, index) => `${index === 0 ? 'M' : 'L'}${num(point.x)} ${num(point.y)}`).join('');
}
