/**
 * The way a thread or a hand takes, as points close enough together to look smooth.
 *
 * Points and not path commands, because a half-drawn movement must stop anywhere along its way, in a browser and in a
 * picture made on the server alike.
 */

export interface Point {
  readonly x: number;
  readonly y: number;
}

const CURVE_POINTS = 10;

export class Trail {
  readonly points: Point[];

  constructor(x: number, y: number) {
    this.points = [{ x, y }];
  }

  to(x: number, y: number): this {
    this.points.push({ x, y });
    return this;
  }

  /** A curve towards (x, y) that is drawn to (cx, cy) on its way. */
  bend(cx: number, cy: number, x: number, y: number): this {
    const from = this.#last();
    for (let i = 1; i <= CURVE_POINTS; i++) {
      const t = i / CURVE_POINTS;
      const u = 1 - t;
      this.to(u * u * from.x + 2 * u * t * cx + t * t * x, u * u * from.y + 2 * u * t * cy + t * t * y);
    }
    return this;
  }

  /** A curve towards (x, y) that leaves towards (ax, ay) and arrives from (bx, by). */
  curve(ax: number, ay: number, bx: number, by: number, x: number, y: number): this {
    const from = this.#last();
    for (let i = 1; i <= CURVE_POINTS; i++) {
      const t = i / CURVE_POINTS;
      const u = 1 - t;
      const [a, b, c, d] = [u * u * u, 3 * u * u * t, 3 * u * t * t, t * t * t];
      this.to(a * from.x + b * ax + c * bx + d * x, a * from.y + b * ay + c * by + d * y);
    }
    return this;
  }

  /** Part of a circle round (x, y), between two angles in quarter turns: 0 right, 1 down, 2 left, 3 up. */
  round(x: number, y: number, radius: number, fromQuarter: number, toQuarter: number): this {
    const steps = Math.max(4, Math.ceil(Math.abs(toQuarter - fromQuarter) * 6));
    for (let i = 0; i <= steps; i++) {
      const angle = ((fromQuarter + ((toQuarter - fromQuarter) * i) / steps) * Math.PI) / 2;
      this.to(x + radius * Math.cos(angle), y + radius * Math.sin(angle));
    }
    return this;
  }

  #last(): Point {
    return this.points.at(-1) ?? { x: 0, y: 0 };
  }
}

export function trail(x: number, y: number): Trail {
  return new Trail(x, y);
}

export function lengthOf(points: readonly Point[]): number {
  let sum = 0;
  points.forEach((point, index) => {
    const before = points[index - 1];
    if (before !== undefined) sum += Math.hypot(point.x - before.x, point.y - before.y);
  });
  return sum;
}

/** The first `length` of the way; all of it if it is shorter. */
export function cutAt(points: readonly Point[], length: number): Point[] {
  const kept: Point[] = [];
  let left = length;
  for (const point of points) {
    const before = kept.at(-1);
    if (before === undefined) {
      kept.push(point);
      continue;
    }
    const step = Math.hypot(point.x - before.x, point.y - before.y);
    if (step >= left) {
      const t = step === 0 ? 0 : left / step;
      kept.push({ x: before.x + (point.x - before.x) * t, y: before.y + (point.y - before.y) * t });
      return kept;
    }
    left -= step;
    kept.push(point);
  }
  return kept;
}

/** Direction of the last step, as a unit vector; to the right if there is none. */
export function heading(points: readonly Point[]): Point {
  const last = points.at(-1);
  for (let i = points.length - 2; i >= 0; i--) {
    const before = points[i];
    if (last === undefined || before === undefined) break;
    const step = Math.hypot(last.x - before.x, last.y - before.y);
    if (step > 0.5) return { x: (last.x - before.x) / step, y: (last.y - before.y) / step };
  }
  return { x: 1, y: 0 };
}
