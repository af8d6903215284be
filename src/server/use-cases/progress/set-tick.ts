import { QueryTypes } from 'sequelize';
import type { TickInput, TicksTaken } from '#contracts/ticks.ts';
import type { Context } from '#server/context.ts';
import type { SentFrom } from '#server/web/sent-from.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { mayRead } from '#server/policies/lesson.ts';
import { seriesFor, type PartFor } from '#server/queries/series/series-for.ts';
import { ticksSince } from '#server/queries/lessons/ticks-since.ts';
import { requireItemsOf, toldByPage, writeTicks } from './_write-ticks.ts';

/**
 * Ticks gathered things or a step, or takes the tick back. Where two devices disagree `judgeTick` says whose word counts.
 * The first step ticked is what counts as having begun a part: reading a page changes nothing.
 * @param from of the outbox that sends it; null for a form
 */
export async function setTick(ctx: Context, input: TickInput, from: SentFrom | null = null): Promise<TicksTaken> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const now = ctx.clock.now();
  const series = found(await seriesFor(ctx.actor, input.series, now));
  const { seat } = series;
  authorize(seat !== null);
  const { subject, ticked, seen = null } = input;
  const told = from === null ? toldByPage(now) : { seen, madeAt: new Date(now.getTime() - from.waitedMs), device: from.device, sequence: from.sequence };
  const taken = async (revision: number): Promise<TicksTaken> => ({ revision, ticks: await ticksSince(seat.enrolmentId, seen ?? revision - 1) });
  if (subject === 'gather') {
    await requireItemsOf(series, input.items);
    return taken(await writeTicks(seat.enrolmentId, input.items.map((key) => ({ subject, key, ticked })), told));
  }
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  authorize(mayRead(part.access));
  return taken(await withTransaction(async () => {
    const revision = await writeTicks(seat.enrolmentId, [{ subject, key: `${part.publicId}:${input.item}`, ticked }], told);
    await noteVisit(seat.enrolmentId, part, now);
    return revision;
  }));
}

async function noteVisit(enrolmentId: number, part: PartFor, now: Date): Promise<void> {
  await sequelize.query(
    'INSERT INTO lesson_visits (enrolment_id, lesson_id, video_ms, created_at, updated_at) VALUES (?, ?, 0, ?, ?) ON DUPLICATE KEY UPDATE updated_at = VALUES(updated_at)',
    { replacements: [enrolmentId, part.id, now, now], type: QueryTypes.INSERT },
  );
}
