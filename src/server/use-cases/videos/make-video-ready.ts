import { link, mkdtemp, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import type { MediaDetail, MediaFile, MediaFiles } from '#contracts/media.ts';
import { captionFaults } from '#core/captions/caption-faults.ts';
import { judgeProbe } from '#core/video/judge-probe.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError } from '#server/errors.ts';
import { VIDEO_UPLOADS_FOLDER, VIDEO_WORK_FOLDER } from '#server/media/video/folders.ts';
import { probeVideo } from '#server/media/video/probe.ts';
import { SMALL, SMALL_LINES, takeStills, transcode, TRANSCODED } from '#server/media/video/transcode.ts';
import { Media, SeriesMedia, VideoUpload } from '#server/models/index.ts';
import { failVideo } from './_fail-video.ts';

const STILLS = 6;
const DEFAULT_POSTER = 'still-2';
const SOURCE = 'source';
const SAVE_PROGRESS_EVERY_MS = 1_000;

const NOT_READ = 'This file cannot be read as a video. Export it once more as MP4 with H.264, the form every cutting program offers, and send that.';
const ENDS_EARLY = 'This video is damaged: it could be read only in part. Export it once more as MP4 and send that.';
const TOO_SLOW = 'This video took too long to make ready, so it was stopped. Export it once more as MP4 with H.264 and send that.';

interface Made {
  readonly files: MediaFiles;
  readonly byteCount: number;
  readonly width: number;
  readonly height: number;
  readonly durationMs: number;
}

/**
 * Looks at an uploaded video, and when it may be decoded makes of it the film and the stills that people see. May be
 * done again from the start by another worker: what it writes lies in a folder of its own until all of it is there.
 * @throws when something of ours fails, so that it is tried again; what is wrong with the file is told in its row.
 */
export async function makeVideoReady(ctx: Context, publicId: string, signal: AbortSignal): Promise<void> {
  const { media: store } = ctx.services;
  const media = await Media.findOne({ where: { publicId, kind: 'video' } });
  if (media === null || media.state === 'ready' || media.state === 'failed') return;
  await media.update({ state: 'probing', progressPermille: 0, failure: null });
  const upload = join(await store.temporaryFolder(VIDEO_UPLOADS_FOLDER), publicId);
  const folder = await mkdtemp(join(await store.temporaryFolder(VIDEO_WORK_FOLDER), `${publicId}-`));
  try {
    // Alone in its folder: a container that names files beside it finds none.
    await link(upload, join(folder, SOURCE));
    const made = await make(ctx, media, folder, signal);
    if (made.ok) {
      await keep(media, made.value);
      await rm(upload, { force: true });
    } else {
      await failVideo(store, publicId, made.says);
    }
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

async function make(ctx: Context, media: Media, folder: string, signal: AbortSignal): Promise<{ ok: true; value: Made } | { ok: false; says: string }> {
  const probed = await probeVideo(folder, SOURCE, signal);
  if (probed === null) return { ok: false, says: NOT_READ };
  const verdict = judgeProbe(probed);
  if (!verdict.ok) return verdict;
  await ctx.services.media.requireRoom((await stat(join(folder, SOURCE))).size);
  await media.update({ state: 'processing' });
  const end = await transcode({ folder, source: SOURCE, verdict, signal, onProgress: progressOf(media) });
  if (end.ended === 'late') return { ok: false, says: TOO_SLOW };
  if (end.ended === 'badly') {
    // A full disk ends it as a broken file does; only the first may be tried again.
    await ctx.services.media.requireRoom();
    return { ok: false, says: ENDS_EARLY };
  }
  const film = await probeVideo(folder, TRANSCODED, signal);
  const picture = film?.streams.find(({ kind }) => kind === 'video');
  if (film?.seconds == null || picture === undefined) return { ok: false, says: ENDS_EARLY };
  const { seconds } = film;
  const stills = await takeStills(folder, TRANSCODED, seconds, STILLS, signal);
  if (stills.length === 0) throw new AppError('UNAVAILABLE', { message: `no still could be taken of ${media.publicId}` });
  // Nothing is put in its place by a worker that lost the job to another.
  signal.throwIfAborted();
  const size = { width: picture.width, height: picture.height };
  const files: Record<string, MediaFile> = {};
  // A film that is small already has no smaller one beside it.
  const small = Math.min(picture.width, picture.height) > SMALL_LINES ? [[SMALL, 'video/mp4', {}] as const] : [];
  for (const [name, contentType, given] of [[TRANSCODED, 'video/mp4', size], ...small, ...stills.map((still) => [still, 'image/jpeg', {}] as const)] as const) {
    const key = `videos/${media.publicId}/${name}`;
    const { size: byteCount } = await stat(join(folder, name));
    await ctx.services.media.put(key, join(folder, name));
    files[name.slice(0, name.lastIndexOf('.'))] = { key, contentType, byteCount, ...given };
  }
  const byteCount = Object.values(files).reduce((sum, file) => sum + file.byteCount, 0);
  return { ok: true, value: { files, byteCount, ...size, durationMs: Math.round(seconds * 1_000) } };
}

/** Writes down how much is done, not more often than anybody looks. */
function progressOf(media: Media): (done: number) => void {
  let savedAt = 0;
  return (done) => {
    const now = Date.now();
    if (now - savedAt < SAVE_PROGRESS_EVERY_MS) return;
    savedAt = now;
    void Media.update({ progressPermille: Math.floor(done * 1_000) }, { where: { id: media.id, state: 'processing' } }).catch(() => undefined);
  };
}

/** Files lie in their places; now the row says so. */
async function keep(media: Media, { files, byteCount, width, height, durationMs }: Made): Promise<void> {
  const poster = Object.hasOwn(files, DEFAULT_POSTER) ? DEFAULT_POSTER : 'still-1';
  await withTransaction(async () => {
    const words = await wordsOfReplaced(media.id, durationMs);
    // A film that came with its series has its captions already.
    const draftDetail = media.draftDetail === null ? null : { poster, ...media.draftDetail };
    await media.update({ state: 'ready', files, byteCount, width, height, durationMs, progressPermille: 1_000, detail: { ...words, poster }, draftDetail });
    await VideoUpload.destroy({ where: { mediaId: media.id } });
  });
}

/** A video that takes the place of one just as long, cut or coloured anew, keeps its captions and chapters. */
async function wordsOfReplaced(mediaId: number, durationMs: number): Promise<MediaDetail> {
  const named = await SeriesMedia.findOne({ where: { draftMediaId: mediaId } });
  const before = named?.mediaId == null ? null : await Media.findByPk(named.mediaId);
  if (before?.durationMs == null || Math.abs(before.durationMs - durationMs) > 1_000) return {};
  const { cues = [], chapters = [] } = before.draftDetail ?? before.detail;
  return captionFaults(cues, durationMs).length > 0 ? {} : { cues, chapters: chapters.filter(({ atMs }) => atMs < durationMs) };
}
