import { QueryTypes } from 'sequelize';
import type { TickInput } from '#contracts/ticks.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { authorize, found } from '#server/errors.ts';
import { GatheringItem } from '#server/models/index.ts';
import { mayRead } from '#server/policies/lesson.ts';
import { seriesFor, type SeriesFor } from '#server/queries/series/series-for.ts';

/**
 * Ticks gathered things or a step, or takes the tick back. When two devices disagree the later change wins, by the
 * moment it was made; a clock that runs ahead counts as now.
 */
export async function setTick(ctx: Context, input: TickInput): Promise<{ ticked: boolean }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const now = ctx.clock.now();
  const series = found(await seriesFor(ctx.actor, input.series, now));
  const { seat } = series;
  authorize(seat !== null);
  const keys = await checkedKeys(input, series);
  const changedAt = input.changedAt === undefined || input.changedAt > now ? now : input.changedAt;
  await sequelize.query(
    `INSERT INTO ticks (enrolment_id, subject, item_key, is_ticked, changed_at) VALUES ${keys.map(() => '(?, ?, ?, ?, ?)').join(', ')}
     ON DUPLICATE KEY UPDATE
       is_ticked = IF(VALUES(changed_at) >= changed_at, VALUES(is_ticked), is_ticked),
       changed_at = GREATEST(changed_at, VALUES(changed_at))`,
    { replacements: keys.flatMap((key) => [seat.enrolmentId, input.subject, key, input.ticked ? 1 : 0, changedAt]), type: QueryTypes.INSERT },
  );
  return { ticked: input.ticked };
}

/** The keys under which the ticks are kept, once it is sure that the things belong to parts she may see. */
async function checkedKeys(input: TickInput, series: SeriesFor): Promise<string[]> {
  if (input.subject === 'gather') {
    const items = await GatheringItem.findAll({ where: { publicId: input.items } });
    authorize(items.length === new Set(input.items).size && items.every(({ lessonId }) => series.parts.some(({ id }) => id === lessonId)));
    return items.map(({ publicId }) => publicId);
  }
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  authorize(mayRead(part.access));
  return [`${part.publicId}:${input.item}`];
}
