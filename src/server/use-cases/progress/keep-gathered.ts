import type { GatheredInput } from '#contracts/following.ts';
import type { Context } from '#server/context.ts';
import { authorize, found } from '#server/errors.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { requireItemsOf, toldByPage, writeTicks } from './_write-ticks.ts';

/**
 * Keeps a whole gathering list at once, as a form without JavaScript sends it: every line that she changed.
 * @returns the number of lines changed
 */
export async function keepGathered(ctx: Context, { series: slug, changes }: GatheredInput): Promise<number> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const now = ctx.clock.now();
  const series = found(await seriesFor(ctx.actor, slug, now));
  const { seat } = series;
  authorize(seat !== null);
  const ticked = new Map(changes.flatMap(({ items, ticked: is }) => items.map((item): [string, boolean] => [item, is])));
  if (ticked.size === 0) return 0;
  await requireItemsOf(series, [...ticked.keys()]);
  await writeTicks(seat.enrolmentId, [...ticked].map(([key, is]) => ({ subject: 'gather', key, ticked: is })), toldByPage(now));
  return changes.length;
}
