/** The least time in milliseconds that `work` took in so many tries: what it needs when nothing else is running. */
export function bestOf(tries: number, work: () => unknown): number {
  let best = Infinity;
  for (let each = 0; each < tries; each += 1) {
    const began = performance.now();
    work();
    best = Math.min(best, performance.now() - began);
  }
  return best;
}
