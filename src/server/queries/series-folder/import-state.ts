import { Op } from 'sequelize';
import type { BroughtIn, FolderRefusal, ImportState } from '#contracts/series-folder.ts';
import type { Actor } from '#server/context.ts';
import { Series, SeriesImport } from '#server/models/index.ts';

/** How far a folder of the asker's is on its way in; null for another one's, too. */
export async function importState(actor: Actor, publicId: string): Promise<ImportState | null> {
  const row = await SeriesImport.findOne({ where: { publicId, ownerId: actor.userId } });
  return row === null ? null : stateOf(row);
}

/** The asker's last five, newest first. */
export async function latestImports(actor: Actor): Promise<ImportState[]> {
  return Promise.all((await SeriesImport.findAll({ where: { ownerId: actor.userId }, order: [['id', 'DESC']], limit: 5 })).map(stateOf));
}

async function stateOf({ id, publicId, fileName, createdAt, state, round, filesDone, filesAll, seriesId, told }: SeriesImport): Promise<ImportState> {
  const common = { publicId, fileName, cameAt: createdAt };
  if (state === 'waiting') {
    if (round > 0) return { ...common, state: 'working', filesDone, filesAll };
    return { ...common, state: 'waiting', before: await SeriesImport.count({ where: { state: 'waiting', id: { [Op.lt]: id } } }) };
  }
  if (state === 'refused') return { ...common, state, told: told as FolderRefusal };
  const series = seriesId === null ? null : await Series.findByPk(seriesId, { attributes: ['slug', 'title'] });
  return { ...common, state, slug: series?.slug ?? null, title: series?.title ?? null, told: told as BroughtIn };
}
