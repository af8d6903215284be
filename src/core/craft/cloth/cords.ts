/**
 * Square-knotted cords: every half knot is a bar that leans the other way from the one before, with a bump at the side it
 * came from; two still cords run down the middle, and the ends hang loose.
 */
import { chanceFrom } from '#core/craft/cloth/chance.ts';
import type { Cord, CordPiece } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { moved, num, ROUND, type PathStore } from '#core/craft/cloth/markup.ts';

interface CordRoom {
  readonly width: number;
  /** Pixels from below the dowel to the ends of the loose cord. */
  readonly height: number;
  /** How far the cords reach up, round the dowel. */
  readonly rise: number;
  readonly pxPerMm: number;
}

export function drawCords(piece: CordPiece, { width, height, rise, pxPerMm }: CordRoom, paths: PathStore): string {
  const room = width / Math.max(1, piece.cords.length);
  return piece.cords
    .map((cord, index) => {
      const wide = Math.min(room * 0.84, cord.widthMm * pxPerMm);
      return drawCord(cord, room * (index + 0.5), wide, { height, rise }, chanceFrom(piece.seed * 31 + index), paths);
    })
    .join('');
}

function drawCord(cord: Cord, x: number, wide: number, { height, rise }: Pick<CordRoom, 'height' | 'rise'>, chance: () => number, paths: PathStore): string {
  const thick = wide * 0.2;
  const step = thick * 1.5;
  const end = height * cord.knotted;
  const still = [-0.1, 0.1].map((off) => `M${num(x + off * wide)} ${num(-rise)}V${num(end)}`).join('');
  const knots = knotPaths(cord, x, wide, step, end);
  const tail = tailPath(x, wide, end - step * 2, height, chance);
  const c = cord.colour;
  const body = (d: string, dark: number, width: number): string => paths.stroke(d, shade(c, dark), width, ROUND);
  return (
    body(tail, 0.35, Math.max(1, thick * 0.34)) + body(tail, 0, Math.max(0.7, thick * 0.2)) +
    body(still, 0.5, thick * 1.1) + body(still, 0.12, thick * 0.74) +
    body(knots.bumps, 0.5, thick * 0.9) + body(knots.bumps, 0.08, thick * 0.62) +
    knots.bars
      .map((d) => paths.stroke(d, shade(c, 0.52), thick * 1.18, ROUND + moved(0, thick * 0.14)) + body(d, 0, thick * 0.9) +
        paths.stroke(d, light(c, 0.4), thick * 0.24, ROUND + moved(0, -thick * 0.22)))
      .join('')
  );
}

function knotPaths(cord: Cord, x: number, wide: number, step: number, end: number): { bars: [string, string]; bumps: string } {
  const bars: [string, string] = ['', ''];
  let bumps = '';
  const thick = step / 1.5;
  for (let y = step, knot = 0; y < end - step * 2; y += step, knot++) {
    if (cord.run !== undefined && Math.floor(knot / cord.run) % 2 === 1) continue;
    const side = knot % 2 === 1 ? 1 : -1;
    bars[knot % 2 === 1 ? 1 : 0] +=
      `M${num(x - side * wide * 0.3)} ${num(y - thick * 0.32)}q${num(side * wide * 0.34)} ${num(-thick * 0.1)} ${num(side * wide * 0.6)} ${num(thick * 0.64)}`;
    bumps += `M${num(x + side * wide * 0.36)} ${num(y + thick * 0.1)}q${num(side * wide * 0.1)} ${num(step * 0.5)} 0 ${num(step * 0.9)}`;
  }
  return { bars, bumps };
}

function tailPath(x: number, wide: number, from: number, height: number, chance: () => number): string {
  const strands = 11;
  let d = '';
  for (let strand = 0; strand < strands; strand++) {
    const start = x + (strand / (strands - 1) - 0.5) * wide * 0.3;
    const fall = (height - from) * (0.82 + chance() * 0.18);
    d += `M${num(start)} ${num(from)}q${num((chance() - 0.5) * wide * 0.3)} ${num(fall * 0.5)} ${num((chance() - 0.5) * wide * 0.8)} ${num(fall)}`;
  }
  return d;
}
