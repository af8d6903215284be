import type { Actor, Context } from '#server/context.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { Enrolment } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

export interface CheckpointFor {
  readonly actor: Actor;
  readonly enrolmentId: number;
  readonly lessonId: number;
}

/**
 * The checkpoint that a photo is for, of the seat of the one who asks.
 * @throws UNAUTHENTICATED; NOT_FOUND when the part is not hers to follow; GONE when her seat ended; VALIDATION when the part asks for no photo.
 */
export async function checkpointFor(ctx: Context, { series: slug, lesson }: { readonly series: string; readonly lesson: string }): Promise<CheckpointFor> {
  const actor = signedIn(ctx);
  const series = found(await seriesFor(actor, slug, ctx.clock.now()));
  const { seat } = series;
  if (seat === null && (await Enrolment.count({ where: { userId: actor.userId, seriesId: series.id } })) > 0) {
    throw new AppError('GONE', { says: 'Your seat in this series has ended, so no photo is taken here any more. What you showed before stays yours.' });
  }
  const part = found(series.parts.find(({ publicId }) => publicId === lesson));
  authorize(seat !== null && part.access.may === 'follow');
  if (part.checkpoint === null) throw new AppError('VALIDATION', { says: 'This part asks for no photo.' });
  return { actor, enrolmentId: seat.enrolmentId, lessonId: part.id };
}
