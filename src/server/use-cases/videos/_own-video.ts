import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { authorize, found } from '#server/errors.ts';
import { Media, Series, SeriesMedia } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** The ready video with this public id and its series, for its teacher only. */
export async function ownVideo(ctx: Context, publicId: string): Promise<{ media: Media; series: Series; name: string }> {
  const media = found(await Media.findOne({ where: { publicId, kind: 'video', state: 'ready' } }));
  const named = found(await SeriesMedia.findOne({ where: { [Op.or]: [{ mediaId: media.id }, { draftMediaId: media.id }] } }));
  const series = found(await Series.findByPk(named.seriesId));
  authorize(mayTeachIn(ctx.actor, series.workroomId));
  return { media, series, name: named.name };
}
