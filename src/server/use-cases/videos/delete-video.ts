import { Op } from 'sequelize';
import type { DeleteVideoInput } from '#contracts/video.ts';
import { partsList } from '#core/series/parts-list.ts';
import type { Context } from '#server/context.ts';
import { AppError, found } from '#server/errors.ts';
import { Enrolment, Media, SeriesMedia, VideoPlace } from '#server/models/index.ts';
import { videoUses } from '#server/queries/videos/video-uses.ts';
import { ownSeries, withSeriesLocked } from '#server/use-cases/workroom/_own-series.ts';

/**
 * Deletes a video that no text speaks of any more: its name, its words, the places students kept in it, and its files.
 * What a worker that dies in between leaves behind, the look after uploads takes away later.
 * @throws CONFLICT while a part speaks of it, or while another one arrives to take its place.
 */
export async function deleteVideo(ctx: Context, { series: slug, name }: DeleteVideoInput): Promise<{ readonly title: string }> {
  const series = await ownSeries(ctx, slug);
  const { title, videos } = await withSeriesLocked(series, async () => {
    const named = found(await SeriesMedia.findOne({ where: { seriesId: series.id, name } }));
    const ids = [named.mediaId, named.draftMediaId].filter((id) => id !== null);
    const ofName = await Media.findAll({ where: { id: ids, kind: 'video' }, lock: true });
    if (ofName.length === 0) throw new AppError('NOT_FOUND');
    if (ofName.some(({ state }) => state !== 'ready' && state !== 'failed')) throw new AppError('CONFLICT', { says: 'A video is on its way to this place. Stop it, or let it become ready, first.' });
    await requireUnused(series.id, name);
    await named.destroy();
    const seats = await Enrolment.findAll({ where: { seriesId: series.id }, attributes: ['id'] });
    await VideoPlace.destroy({ where: { name, enrolmentId: { [Op.in]: seats.map(({ id }) => id) } } });
    return { title: named.title === '' ? name : named.title, videos: ofName };
  });
  for (const media of videos) {
    // The row last: a file without a row would never be found again.
    await Promise.all(Object.values(media.files).map(({ key }) => ctx.services.media.remove(key)));
    await media.destroy();
  }
  return { title };
}

async function requireUnused(seriesId: number, name: string): Promise<void> {
  const uses = await videoUses(seriesId, name);
  const shown = uses.filter(({ isPublished }) => isPublished).map(({ number }) => number);
  if (shown.length > 0) throw new AppError('CONFLICT', { says: `Students see it in ${partsList(shown)}. Take it out of the text there and publish; then it can be deleted.` });
  if (uses.length > 0) throw new AppError('CONFLICT', { says: `The text of ${partsList(uses.map(({ number }) => number))} speaks of it. Take it out there first.` });
}
