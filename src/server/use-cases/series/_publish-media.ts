import { Op } from 'sequelize';
import { Media, SeriesMedia } from '#server/models/index.ts';

/**
 * Puts videos that are ready in the place of those they replace, and their drafted words in the place of what students
 * read: of those files of a series whose name `goesOut`.
 */
export async function publishMedia(seriesId: number, goesOut: (name: string) => boolean): Promise<void> {
  const named = (await SeriesMedia.findAll({ where: { seriesId } })).filter(({ name }) => goesOut(name));
  for (const file of named) {
    const draft = file.draftMediaId === null ? null : await Media.findByPk(file.draftMediaId);
    if (draft?.state !== 'ready') continue;
    // From now on it counts how long nothing has shown the one it replaces.
    if (file.mediaId !== null) await Media.update({ progressPermille: 1_000 }, { where: { id: file.mediaId } });
    await file.update({ mediaId: draft.id, draftMediaId: null });
  }
  const shown = named.map(({ mediaId }) => mediaId).filter((id) => id !== null);
  for (const media of await Media.findAll({ where: { id: shown, draftDetail: { [Op.ne]: null } } })) {
    await media.update({ detail: media.draftDetail ?? media.detail, draftDetail: null });
  }
}
