import type { Stash } from '#core/gathering/stash.ts';
import { KeptStash } from '#server/models/index.ts';

/** What a student has already, by the key of the yarn; empty without a seat. */
export async function stashOf(enrolmentId: number | null): Promise<ReadonlyMap<string, Stash>> {
  if (enrolmentId === null) return new Map();
  const rows = await KeptStash.findAll({ where: { enrolmentId } });
  return new Map(rows.map(({ yarnKey, amount, unit }) => [yarnKey, { amount, unit }]));
}
