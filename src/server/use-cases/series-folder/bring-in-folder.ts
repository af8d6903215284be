import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { BroughtIn, FolderRefusal } from '#contracts/series-folder.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError } from '#server/errors.ts';
import { removePhoto } from '#server/media/photo.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import { Series, SeriesImport } from '#server/models/index.ts';
import { putUp } from '#server/notices/put-up.ts';
import { ARRIVED_FOLDERS } from '#server/series-folder/folders.ts';
import { bringIn } from './_bring-in.ts';

const GAVE_UP: FolderRefusal = { says: 'This folder did not come in, and we do not know why. Nothing of it was kept. Send it again; if it stays so, make the zip anew.', faults: [] };

/**
 * The worker's part: makes the series of a folder that has arrived, tells its teacher, and removes the zip. May be begun
 * again after a worker died: what that one put in its place goes first, and only the last round may end it.
 */
export async function bringInFolder(ctx: Context, { folder: publicId }: { readonly folder: string }, { signal }: { readonly signal: AbortSignal }): Promise<void> {
  const arrived = await begin(ctx, publicId);
  if (arrived !== null) {
    const { ownerId, workroomId, round } = arrived;
    const isMine = { publicId, round, state: 'waiting' } as const;
    try {
      await bringIn(ctx.services, { ownerId, workroomId }, await pathOf(ctx, publicId), {
        signal,
        willPut: async (mediaIds) => { await SeriesImport.update({ mediaIds, filesAll: mediaIds.length, filesDone: 0 }, { where: isMine }); },
        hasPut: async (filesDone) => { await SeriesImport.update({ filesDone }, { where: isMine }); },
        also: (series, told) => end(arrived, { state: 'done', seriesId: series.id, told }),
      });
    } catch (error) {
      // The disk and the database come back; what is wrong with the folder stays so.
      if (!(error instanceof AppError) || !['VALIDATION', 'CONFLICT', 'TOO_LARGE'].includes(error.code)) throw error;
      const told = { says: error.says, faults: Object.entries(error.fields).map(([file, says]) => ({ file, says })) };
      await withTransaction(() => end(arrived, { state: 'refused', told }));
    }
  }
  await rm(await pathOf(ctx, publicId), { force: true });
}

/** Every try ended badly through no fault of the folder, as far as we know. */
export async function giveUpFolder(ctx: Context, { folder: publicId }: { readonly folder: string }): Promise<void> {
  const arrived = await begin(ctx, publicId);
  if (arrived !== null) await withTransaction(() => end(arrived, { state: 'refused', told: GAVE_UP }));
  await rm(await pathOf(ctx, publicId), { force: true });
}

async function pathOf({ services }: Context, publicId: string): Promise<string> {
  return join(await services.media.temporaryFolder(ARRIVED_FOLDERS), publicId);
}

/** Takes it over from a worker that died or lost its lease. Null when it has come in, was refused, or is gone with its workroom. */
async function begin({ services: { media } }: Context, publicId: string): Promise<SeriesImport | null> {
  const arrived = await withTransaction(async () => {
    const row = await SeriesImport.findOne({ where: { publicId, state: 'waiting' }, lock: true });
    return row === null ? null : row.update({ round: row.round + 1 });
  });
  if (arrived === null) return null;
  const uploads = await media.temporaryFolder(VIDEO_UPLOADS_FOLDER);
  for (const id of arrived.mediaIds) {
    await removePhoto(media, `pictures/${id}`);
    await rm(join(uploads, id), { force: true });
  }
  return arrived;
}

type Ending = { readonly state: 'done'; readonly seriesId: number; readonly told: BroughtIn } | { readonly state: 'refused'; readonly told: FolderRefusal };

/** Within the caller's transaction. @throws when another worker has begun with it, so that nothing comes in twice. */
async function end({ id, publicId, ownerId, fileName, round }: SeriesImport, ending: Ending): Promise<void> {
  const row = await SeriesImport.findByPk(id, { lock: true });
  if (row?.state !== 'waiting' || row.round !== round) throw new Error('another worker brings this folder in');
  await row.update(ending);
  const series = ending.state === 'done' ? await Series.findByPk(ending.seriesId) : null;
  await putUp({
    userId: ownerId,
    kind: 'folder',
    seriesId: series?.id ?? null,
    noticeId: null,
    byLetter: false,
    dedupeKey: `folder:${publicId}`,
    said: {
      title: series === null ? `${fileName} did not come in` : `“${series.title}” has come in`,
      from: '',
      blocks: [{ kind: 'words', words: series === null ? 'Nothing of it was kept. What stands in the way is said file by file.' : 'It is a draft in your workroom; nobody else sees it.' }],
      act: { label: 'See how it went', href: `/workroom/series/bring-in/${publicId}` },
    },
  });
}
