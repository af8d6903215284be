import { Op } from 'sequelize';
import { Media, SeriesMedia } from '#server/models/index.ts';

/** Puts videos that are ready in the place of those they replace, and their drafted words in the place of what students read. */
export async function publishMedia(seriesId: number): Promise<void> {
  for (const named of await SeriesMedia.findAll({ where: { seriesId, draftMediaId: { [Op.ne]: null } } })) {
    const draft = named.draftMediaId === null ? null : await Media.findByPk(named.draftMediaId);
    if (draft?.state !== 'ready') continue;
    // From now on it counts how long nothing has shown the one it replaces.
    if (named.mediaId !== null) await Media.update({ progressPermille: 1_000 }, { where: { id: named.mediaId } });
    await named.update({ mediaId: draft.id, draftMediaId: null });
  }
  const shown = await SeriesMedia.findAll({ where: { seriesId, mediaId: { [Op.ne]: null } } });
  for (const media of await Media.findAll({ where: { id: shown.map(({ mediaId }) => mediaId ?? 0), draftDetail: { [Op.ne]: null } } })) {
    await media.update({ detail: media.draftDetail ?? media.detail, draftDetail: null });
  }
}
