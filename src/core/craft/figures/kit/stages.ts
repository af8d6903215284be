/** Movements one after another: how far each has come when the whole has come so far. */

/**
 * @param weights how long each movement takes, compared with the others
 * @returns for each movement 0 (not begun) to 1 (done)
 */
export function stages<const W extends readonly number[]>(progress: number, weights: W): { [K in keyof W]: number } {
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  let before = 0;
  const shares = weights.map((weight) => {
    const share = clamp((progress * total - before) / weight);
    before += weight;
    return share;
  });
  return shares as { [K in keyof W]: number };
}

/** One of `count` equal movements. */
export function stageOf(progress: number, index: number, count: number): number {
  return clamp(progress * count - index);
}

/** Slow at both ends, as a hand moves. */
export function eased(share: number): number {
  return share * share * (3 - 2 * share);
}

function clamp(value: number): number {
  return Math.max(0, Math.min(1, value));
}
