import { QueryTypes } from 'sequelize';
import type { FinishInput } from '#contracts/following.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

export interface PartFinished {
  readonly number: number;
  /** Number of the part after it; null at the end of the series. */
  readonly next: number | null;
  /** Nothing comes after it: no further part is being written. */
  readonly isLast: boolean;
}

/**
 * The student says that a part is done, or that it is not done after all. Where the teacher asks for a photo, her
 * verdict ends the part, and the student cannot.
 */
export async function finishPart(ctx: Context, input: FinishInput): Promise<PartFinished> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const now = ctx.clock.now();
  const series = found(await seriesFor(ctx.actor, input.series, now));
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  const { seat } = series;
  authorize(seat !== null && part.access.may === 'follow');
  if (part.checkpoint !== null) throw new AppError('CONFLICT', { says: `Part ${part.number} is done when your photo has the verdict “weave on”.` });
  await sequelize.query(
    `INSERT INTO lesson_visits (enrolment_id, lesson_id, finished_at, video_ms, created_at, updated_at) VALUES (:seat, :lesson, :at, 0, :now, :now)
     ON DUPLICATE KEY UPDATE finished_at = IF(:done, COALESCE(finished_at, :now), NULL), updated_at = :now`,
    { replacements: { seat: seat.enrolmentId, lesson: part.id, at: input.done ? now : null, done: input.done ? 1 : 0, now }, type: QueryTypes.INSERT },
  );
  const next = series.parts.find(({ number }) => number === part.number + 1)?.number ?? null;
  return { number: part.number, next, isLast: next === null && series.toCome.length === 0 };
}
