import { QueryTypes } from 'sequelize';
import type { FinishInput } from '#contracts/following.ts';
import { awaitedPart } from '#core/timetable/opening.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { PartOpening } from '#server/models/index.ts';
import { seriesFor, type PartFor } from '#server/queries/series/series-for.ts';

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
  await withTransaction(async () => {
    await sequelize.query(
      `INSERT INTO lesson_visits (enrolment_id, lesson_id, finished_at, video_ms, created_at, updated_at) VALUES (:seat, :lesson, :at, 0, :now, :now)
       ON DUPLICATE KEY UPDATE finished_at = IF(:done, COALESCE(finished_at, :now), NULL), updated_at = :now`,
      { replacements: { seat: seat.enrolmentId, lesson: part.id, at: input.done ? now : null, done: input.done ? 1 : 0, now }, type: QueryTypes.INSERT },
    );
    if (input.done) await noteOpened(seat.enrolmentId, series.parts.filter(({ opens }) => awaitedPart(opens) === part.publicId), now);
  });
  const next = series.parts.find(({ number }) => number === part.number + 1)?.number ?? null;
  return { number: part.number, next, isLast: next === null && series.toCome.length === 0 };
}

/** She sees at once what her word has opened: on record as known, so that no letter tells it again. */
async function noteOpened(enrolmentId: number, parts: readonly PartFor[], now: Date): Promise<void> {
  await PartOpening.bulkCreate(parts.filter(({ isPreview }) => !isPreview).map(({ id }) => ({ enrolmentId, lessonId: id, toldBy: 'seat' as const, openedAt: now })), { ignoreDuplicates: true });
}
