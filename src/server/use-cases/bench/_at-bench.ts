import type { Actor, Context } from '#server/context.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Enrolment, ProgressPhoto, Series, User } from '#server/models/index.ts';
import { maySitAtBench } from '#server/policies/workroom.ts';

/**
 * The photo that somebody at the bench means, by its public id.
 * @throws UNAUTHENTICATED; NOT_FOUND for another workroom's photo.
 */
export async function photoAtBench(ctx: Context, publicId: string): Promise<{ actor: Actor; photo: ProgressPhoto; series: Series }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const photo = found(await ProgressPhoto.findOne({ where: { publicId } }));
  const enrolment = found(await Enrolment.findByPk(photo.enrolmentId));
  const series = found(await Series.findByPk(enrolment.seriesId));
  authorize(maySitAtBench(ctx.actor, series.workroomId));
  return { actor: ctx.actor, photo, series };
}

/** That somebody else was first: who, and with which verdict. */
export async function answeredAlready(byId: number | null, verdict: 'weave-on' | 'mend-first'): Promise<AppError> {
  const by = byId === null ? null : await User.findByPk(byId);
  return new AppError('CONFLICT', { says: `${by?.name ?? 'Somebody'} answered this photo in the meantime: ${verdict === 'weave-on' ? 'weave on' : 'mend first'}. Yours was not sent.` });
}
