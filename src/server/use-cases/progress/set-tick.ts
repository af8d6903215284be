import { QueryTypes } from 'sequelize';
import type { TickInput } from '#contracts/ticks.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { mayRead } from '#server/policies/lesson.ts';
import { seriesFor, type PartFor } from '#server/queries/series/series-for.ts';
import { requireItemsOf, writeTicks } from './_write-ticks.ts';

/**
 * Ticks gathered things or a step, or takes the tick back. When two devices disagree the later change wins, by the
 * moment it was made; a clock that runs ahead counts as now. The first step ticked is what counts as having begun a
 * part: reading a page changes nothing.
 */
export async function setTick(ctx: Context, input: TickInput): Promise<{ ticked: boolean }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const now = ctx.clock.now();
  const series = found(await seriesFor(ctx.actor, input.series, now));
  const { seat } = series;
  authorize(seat !== null);
  const changedAt = input.changedAt === undefined || input.changedAt > now ? now : input.changedAt;
  const { subject, ticked } = input;
  if (subject === 'gather') {
    await requireItemsOf(series, input.items);
    await writeTicks(seat.enrolmentId, input.items.map((key) => ({ subject, key, ticked })), changedAt);
    return { ticked };
  }
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  authorize(mayRead(part.access));
  await withTransaction(async () => {
    await writeTicks(seat.enrolmentId, [{ subject, key: `${part.publicId}:${input.item}`, ticked }], changedAt);
    await noteVisit(seat.enrolmentId, part, now);
  });
  return { ticked };
}

async function noteVisit(enrolmentId: number, part: PartFor, now: Date): Promise<void> {
  await sequelize.query(
    'INSERT INTO lesson_visits (enrolment_id, lesson_id, video_ms, created_at, updated_at) VALUES (?, ?, 0, ?, ?) ON DUPLICATE KEY UPDATE updated_at = VALUES(updated_at)',
    { replacements: [enrolmentId, part.id, now, now], type: QueryTypes.INSERT },
  );
}
