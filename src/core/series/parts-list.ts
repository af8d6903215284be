import { listed } from '#core/listed.ts';

/** Numbers of parts in words: `Part 2`, `Parts 2, 3 and 5 to 7`. At least one number. */
export function partsList(numbers: readonly number[]): string {
  const runs: number[][] = [];
  for (const part of [...numbers].sort((a, b) => a - b)) {
    const run = runs.at(-1);
    if (run !== undefined && run.at(-1) === part - 1) run.push(part);
    else runs.push([part]);
  }
  const words = runs.flatMap((run) => (run.length > 2 ? [`${run[0] ?? ''} to ${run.at(-1) ?? ''}`] : run.map(String)));
  return `${numbers.length === 1 ? 'Part' : 'Parts'} ${listed(words)}`;
}
