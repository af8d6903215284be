/**
 * A thread drawn tight: the shortest way past round rods that a thread of its thickness can take, found by pulling a line
 * of points straight again and again and pushing every point out of whatever it would cut through. Its length is added up
 * point by point. Nothing here knows a formula for yarn.
 *
 * x runs across the cloth, y up along the warp, z towards the face. Rods stand along y.
 */
import { endsIn, turnsBefore, type Lay, type Pass } from '#core/craft/interlacement/lay.ts';

export interface Place {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/** A warp end as the thread's axis meets it: no nearer than both half thicknesses. */
export interface Rod {
  readonly x: number;
  readonly radius: number;
}

export interface Pull {
  readonly rods: readonly Rod[];
  /** Points in the way from rod to rod's radius. */
  readonly stepMm: number;
  /** The line keeps the heights it was given: its rows are beaten. */
  readonly level?: true;
  /** Of a partner it twists about: the thread's axis stays this far from the middle line between both. */
  readonly twistRadiusMm?: number;
}

/** Length of the tight line; both its ends stay where they are. */
export function tautLength(way: readonly Place[], pull: Pull): number {
  const line = resample(way, pull.stepMm);
  const near = line.map(({ x }) => pull.rods.filter((rod) => Math.abs(rod.x - x) < rod.radius * 1.6 + pull.stepMm * 3));
  let before = Number.POSITIVE_INFINITY;
  for (let sweep = 0; sweep < 40_000; sweep += 1) {
    for (let i = 1; i < line.length - 1; i += 1) straighten(line, i, near[i] ?? [], pull);
    if (sweep % 25 !== 0) continue;
    const now = lengthOf(line);
    if (Math.abs(before - now) < now * 2e-7) return now;
    before = now;
  }
  return lengthOf(line);
}

interface Point {
  x: number;
  y: number;
  z: number;
}

/** Pulled a little past straight: the line comes to rest in far fewer rounds (successive over-relaxation, Young 1954). */
const PULL = 1.7;

function straighten(line: readonly Point[], i: number, rods: readonly Rod[], pull: Pull): void {
  const [a, p, b] = [line[i - 1], line[i], line[i + 1]];
  if (a === undefined || p === undefined || b === undefined) return;
  p.x += PULL * ((a.x + b.x) / 2 - p.x);
  p.z += PULL * ((a.z + b.z) / 2 - p.z);
  if (pull.level === undefined) p.y += PULL * ((a.y + b.y) / 2 - p.y);
  for (const rod of rods) {
    const [dx, away] = [p.x - rod.x, Math.hypot(p.x - rod.x, p.z)];
    if (away >= rod.radius || away === 0) continue;
    p.x = rod.x + (dx * rod.radius) / away;
    p.z *= rod.radius / away;
  }
  const twist = pull.twistRadiusMm ?? 0;
  const apart = Math.hypot(p.y, p.z);
  if (apart < twist && apart > 0) {
    p.y *= twist / apart;
    p.z *= twist / apart;
  }
}

function resample(way: readonly Place[], stepMm: number): Point[] {
  return way.flatMap((to, index): Point[] => {
    const from = way[index - 1];
    if (from === undefined) return [{ ...to }];
    const parts = Math.max(1, Math.ceil(Math.hypot(to.x - from.x, to.y - from.y, to.z - from.z) / stepMm));
    return Array.from({ length: parts }, (_, part) => {
      const t = (part + 1) / parts;
      return { x: from.x + (to.x - from.x) * t, y: from.y + (to.y - from.y) * t, z: from.z + (to.z - from.z) * t };
    });
  });
}

function lengthOf(line: readonly Place[]): number {
  return line.reduce((sum, to, index) => {
    const from = line[index - 1];
    return from === undefined ? sum : sum + Math.hypot(to.x - from.x, to.y - from.y, to.z - from.z);
  }, 0);
}

/** A thread's lay and where it lies: the height of its row at the begin and at the end of every pass. */
export interface WalkedPass {
  readonly pass: Pass;
  readonly fromY: number;
  readonly toY: number;
}

/** A rough way along a lay, outside of every rod, to be drawn tight: past each end on its face, through gaps, round turns. */
export function wayAlong(passes: readonly WalkedPass[], xOf: (end: number) => number, radiusMm: number): Place[] {
  const way: Place[] = [];
  const out = radiusMm * 1.05;
  passes.forEach(({ pass, fromY, toY }, index) => {
    const before = passes[index - 1];
    if (before !== undefined) way.push(...between(before, { pass, fromY, toY }, xOf, out));
    const side = pass.face === 'front' ? 1 : -1;
    const count = endsIn(pass);
    for (let k = 0; k < count; k += 1) {
      const end = pass.from + Math.sign(pass.to - pass.from) * k;
      const y = count === 1 ? fromY : fromY + ((toY - fromY) * k) / (count - 1);
      way.push({ x: xOf(end), y, z: side * out });
    }
    if (count === 1 && toY !== fromY) way.push({ x: xOf(pass.to), y: toY, z: side * out });
  });
  return way;
}

function between(before: WalkedPass, next: WalkedPass, xOf: (end: number) => number, out: number): Place[] {
  if (!turnsBefore(next.pass, before.pass)) {
    return [{ x: (xOf(before.pass.to) + xOf(next.pass.from)) / 2, y: (before.toY + next.fromY) / 2, z: 0 }];
  }
  return turn(xOf(before.pass.to), before.toY, next.fromY, before.pass.face === 'front' ? 1 : -1, before.pass.way === 'right' ? 1 : -1, out);
}

/** Half round an end: from one face to the other. */
export function turn(x: number, fromY: number, toY: number, side: 1 | -1, going: 1 | -1, out: number): Place[] {
  return [1, 2, 3, 4, 5].map((k) => {
    const angle = (k / 6) * Math.PI;
    return { x: x + going * out * Math.sin(angle), y: fromY + ((toY - fromY) * k) / 6, z: side * out * Math.cos(angle) };
  });
}

/** A lay at one height. */
export const levelLay = (lay: Lay, y: number): WalkedPass[] => lay.map((pass) => ({ pass, fromY: y, toY: y }));
