/**
 * Knots as they look from the front, drawn once for each thickness and colour: every strand in the order in which it
 * lies. Origin in the middle of the knot's upper edge; the fillers are part of the knot, so that it covers what runs
 * behind it.
 */
import type { HungStrand } from '#core/craft/cloth/cloth-piece.ts';

export interface Yarned {
  readonly colour: string;
  readonly dMm: number;
}

const line = ({ colour, dMm }: Yarned, x0: number, y0: number, x1: number, y1: number): HungStrand => ({
  colour, widthMm: dMm, way: [x0, y0, x0, y0 + (y1 - y0) / 3, x1, y1 - (y1 - y0) / 3, x1, y1],
});

/** A bar across the fillers that comes from one side, with the bump it makes there. */
function bar({ colour, dMm: d }: Yarned, from: -1 | 1, top: number, high: number): HungStrand {
  const x = (at: number): number => from * at * d;
  return {
    colour,
    widthMm: d,
    way: [x(1.5), top, x(2.35), top + high * 0.06, x(2.2), top + high * 0.62, x(1.2), top + high * 0.5, x(0.4), top + high * 0.42, x(-0.4), top + high * 0.52, x(-1.5), top + high * 0.92],
  };
}

/** Behind the fillers, the other way. */
function behind({ colour, dMm: d }: Yarned, from: -1 | 1, top: number, high: number): HungStrand {
  const x = (at: number): number => from * at * d;
  return { colour, widthMm: d, way: [x(1.5), top, x(1.9), top + high * 0.5, x(-1.9), top + high * 0.5, x(-1.5), top + high] };
}

/** Both halves of a square knot, `highMm` together; of a turning column both from the same side. */
export function squareKnot(cord: Yarned, highMm: number, spiral: boolean): HungStrand[] {
  const { dMm: d } = cord;
  const half = highMm / 2;
  const second = spiral ? -1 : 1;
  return [
    behind(cord, 1, 0, half),
    behind(cord, second === 1 ? -1 : 1, half, half),
    line(cord, -0.5 * d, 0, -0.5 * d, highMm),
    line(cord, 0.5 * d, 0, 0.5 * d, highMm),
    bar(cord, -1, 0, half),
    bar(cord, second, half, half),
  ];
}

/** Two turns of one end over the cord that is held across. */
export function doubleHalfHitch({ colour, dMm: d }: Yarned): HungStrand[] {
  const turn = (x: number): HungStrand => ({ colour, widthMm: d * 0.92, way: [x - 0.1 * d, -0.2 * d, x + 0.18 * d, 0.5 * d, x + 0.2 * d, 1.4 * d, x - 0.06 * d, 2.2 * d] });
  return [turn(-0.46 * d), turn(0.46 * d)];
}

/** The fold over the front of the rod, its bar below it; `rodMm` how far it reaches up. */
export function larksHead({ colour, dMm: d }: Yarned, rodMm: number): HungStrand[] {
  return [
    { colour, widthMm: d, way: [-0.62 * d, -rodMm, -0.62 * d, -rodMm * 0.6, -1.1 * d, -0.2 * d, -1.05 * d, 0.5 * d, -0.8 * d, 1.15 * d, 0.8 * d, 1.15 * d, 1.05 * d, 0.5 * d, 1.1 * d, -0.2 * d, 0.62 * d, -rodMm * 0.6, 0.62 * d, -rodMm] },
  ];
}

/** Turns round a bundle `wideMm` across, one below the other. */
export function wraps({ colour, dMm: d }: Yarned, turns: number, wideMm: number): HungStrand[] {
  const half = wideMm / 2;
  return Array.from({ length: turns }, (_, turn) => {
    const y = (turn + 0.35) * d;
    return { colour, widthMm: d, way: [-half, y, -half * 0.4, y + d * 0.34, half * 0.4, y + d * 0.42, half, y + d * 0.3] };
  });
}
