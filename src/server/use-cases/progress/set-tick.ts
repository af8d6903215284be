import { QueryTypes } from 'sequelize';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { authorize, found } from '#server/errors.ts';
import { GatheringItem, Lesson } from '#server/models/index.ts';
import { mayRead } from '#server/policies/lesson.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import type { TickInput } from '#contracts/ticks.ts';

/**
 * Ticks a gathered thing or a step, or takes the tick back. When two devices disagree the later change wins, by the
 * moment it was made; a clock that runs ahead counts as now.
 */
export async function setTick(ctx: Context, input: TickInput): Promise<{ ticked: boolean }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const now = ctx.clock.now();
  const series = found(await seriesFor(ctx.actor, input.series, now));
  const { seat } = series;
  authorize(seat !== null);
  const itemKey = await checkedKey(input, series);
  const changedAt = input.changedAt === undefined || input.changedAt > now ? now : input.changedAt;
  await sequelize.query(
    `INSERT INTO ticks (enrolment_id, subject, item_key, is_ticked, changed_at) VALUES (?, ?, ?, ?, ?)
     ON DUPLICATE KEY UPDATE
       is_ticked = IF(VALUES(changed_at) >= changed_at, VALUES(is_ticked), is_ticked),
       changed_at = GREATEST(changed_at, VALUES(changed_at))`,
    { replacements: [seat.enrolmentId, input.subject, itemKey, input.ticked ? 1 : 0, changedAt], type: QueryTypes.INSERT },
  );
  return { ticked: input.ticked };
}

/** The key under which the tick is kept, once it is sure that the thing belongs to a part she may see. */
async function checkedKey(input: TickInput, series: NonNullable<Awaited<ReturnType<typeof seriesFor>>>): Promise<string> {
  if (input.subject === 'gather') {
    const item = found(await GatheringItem.findOne({ where: { publicId: input.item } }));
    const lesson = found(await Lesson.findByPk(item.lessonId));
    authorize(series.parts.some(({ id }) => id === lesson.id));
    return item.publicId;
  }
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  authorize(mayRead(part.access));
  return `${part.publicId}:${input.item}`;
}
