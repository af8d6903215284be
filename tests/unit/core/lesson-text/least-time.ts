/**
 * The least time in milliseconds that `work` takes: what it needs when nothing else is running. Tries again, a few
 * times, only while it took longer than `enoughMs`.
 */
export function leastTime(work: () => unknown, enoughMs: number): number {
  let least = Infinity;
  for (let tries = 0; tries < 20 && least >= enoughMs; tries += 1) {
    const began = performance.now();
    work();
    least = Math.min(least, performance.now() - began);
  }
  return least;
}
