import { randomUUID } from 'node:crypto';
import { rm, stat } from 'node:fs/promises';
import type { MediaFile } from '#contracts/media.ts';
import type { Context } from '#server/context.ts';
import { seriesAsFolder } from '#server/queries/series-folder/series-as-folder.ts';
import { SERIES_FOLDERS } from '#server/series-folder/folders.ts';
import { writeZip } from '#server/series-folder/write-zip.ts';
import { ownSeries } from '#server/use-cases/workroom/_own-series.ts';

/**
 * Writes the present draft of a series as a zip, for its teacher. It lies with the temporary files, one for each series
 * with films and one without, and is swept away with them; so it can be sent at the pace of any line, and go on after a cut.
 * @throws NOT_FOUND for another teacher's series; UNAVAILABLE when the disk is full.
 */
export async function takeSeries(ctx: Context, { slug, withFilms }: { slug: string; withFilms: boolean }): Promise<MediaFile> {
  const { media: store } = ctx.services;
  const series = await ownSeries(ctx, slug);
  const files = await seriesAsFolder(series, { withFilms });
  await store.requireRoom(files.reduce((sum, { content }) => sum + (typeof content === 'string' ? content.length : content.byteCount), 0));
  await store.temporaryFolder(SERIES_FOLDERS);
  const path = await store.temporaryPath(`${SERIES_FOLDERS}/${randomUUID()}`);
  try {
    await writeZip(path, files.map(({ name, content }) => ({ name, content: typeof content === 'string' ? content : { byteCount: content.byteCount, open: () => store.open(content.key) } })));
    const { size: byteCount } = await stat(path);
    const key = `temporary/${SERIES_FOLDERS}/${series.publicId}${withFilms ? '-with-films' : ''}.zip`;
    await store.put(key, path);
    return { key, contentType: 'application/zip', byteCount };
  } finally {
    await rm(path, { force: true });
  }
}
