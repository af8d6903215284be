import type { Actor } from '#server/context.ts';
import { Series, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { seriesAsFolder } from '#server/queries/series-folder/series-as-folder.ts';

export interface FolderSizes {
  readonly slug: string;
  readonly title: string;
  readonly workroom: { readonly name: string; readonly timeZone: string };
  readonly withoutFilmsBytes: number;
  readonly filmBytes: number;
  readonly filmCount: number;
}

/** How large the zip of a series will be. @returns null when it is another teacher's, or there is none. */
export async function folderSizes(actor: Actor, slug: string): Promise<FolderSizes | null> {
  const series = await Series.findOne({ where: { slug } });
  if (series === null || !mayTeachIn(actor, series.workroomId)) return null;
  const workroom = await Workroom.findByPk(series.workroomId, { rejectOnEmpty: true });
  const files = (await seriesAsFolder(series, { withFilms: true })).map(({ name, content }) => ({ isFilm: name.endsWith('.mp4'), byteCount: typeof content === 'string' ? Buffer.byteLength(content) : content.byteCount }));
  const bytesOf = (isFilm: boolean): number => files.reduce((sum, file) => sum + (file.isFilm === isFilm ? file.byteCount : 0), 0);
  return {
    slug,
    title: series.title,
    workroom: { name: workroom.name, timeZone: workroom.timeZone },
    withoutFilmsBytes: bytesOf(false),
    filmBytes: bytesOf(true),
    filmCount: files.filter(({ isFilm }) => isFilm).length,
  };
}
