import type { SeriesFile } from '#contracts/series-folder.ts';
import type { FolderFault } from '#core/series-folder/judge-entries.ts';
import type { Actor, Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { processVideo } from '#server/jobs/definitions/videos.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Media, SeriesMedia, User, type Lesson, type Series } from '#server/models/index.ts';
import { refused, withZip } from '#server/series-folder/open-zip.ts';
import { freeAddress } from '#server/use-cases/series/_free-address.ts';
import { requirePictureRoom } from '#server/use-cases/pictures/_picture-room.ts';
import { requireVideoRoom } from '#server/use-cases/videos/_video-room.ts';
import { checkFolder } from './_check-folder.ts';
import { makeSeries } from './_make-series.ts';
import { takeMedia, type TakenMedia, type TakenPicture, type TakenVideo } from './_take-media.ts';

export interface BroughtIn {
  readonly slug: string;
  readonly title: string;
  readonly partCount: number;
  /** Films that the worker makes ready now. */
  readonly filmCount: number;
  /** What came in as it is and has to be mended before publishing. */
  readonly toMend: readonly FolderFault[];
}

const FILM_STAYED_BEHIND = 'The film did not come with its series. Send it here; captions and chapters are kept when it is as long as it was.';

/**
 * Makes a draft series in the asker's workroom from the zip at `path`: all of it, or nothing.
 * @throws VALIDATION with a sentence for each file that stands in the way; CONFLICT when her room for videos or pictures is used up;
 * UNAVAILABLE when the disk is full.
 */
export async function bringInSeries(ctx: Context, { path }: { path: string }): Promise<BroughtIn> {
  const actor = signedIn(ctx);
  const { workroomId } = actor;
  authorize(workroomId !== null, 'FORBIDDEN');
  return withZip(path, async (zip) => {
    const folder = await checkFolder((name) => zip.text(name));
    requireAllNamed(zip.names, folder.file);
    await ctx.services.media.requireRoom();
    const media = await takeMedia(ctx.services.media, zip, folder.file);
    try {
      return await withTransaction(async () => {
        const slug = await freeAddress(folder.file.title);
        const { series, lessons } = await makeSeries({ workroomId, slug }, folder);
        await writeMedia(actor, series, lessons, media);
        return { slug, title: series.title, partCount: lessons.length, filmCount: media.videos.filter(({ filmBytes }) => filmBytes !== null).length, toMend: folder.toMend };
      });
    } catch (error) {
      await media.undo();
      throw error;
    }
  });
}

/** A file that nothing speaks of would be lost without a word. */
function requireAllNamed(names: readonly string[], { lessons, videos, pictures }: SeriesFile): void {
  const named = new Set(['series.yaml', 'piece.json', ...lessons.map(({ file }) => file), ...videos.flatMap(({ film, captions }) => [film, captions]), ...pictures.map(({ file }) => file)]);
  const faults = names.filter((name) => !named.has(name)).map((file) => ({ file, says: 'series.yaml says nothing of this file. Name it there, or take it out.' }));
  const twice = [...videos, ...pictures].map(({ name }) => name).find((name, index, all) => all.indexOf(name) !== index);
  if (twice !== undefined) faults.push({ file: 'series.yaml', says: `Two videos or pictures have the name ${twice}.` });
  if (faults.length > 0) throw refused(faults);
}

async function writeMedia(actor: Actor, series: Series, lessons: readonly Lesson[], { videos, pictures }: TakenMedia): Promise<void> {
  // The person's row is the lock of her room for videos and for pictures.
  found(await User.findByPk(actor.userId, { lock: true }));
  if (pictures.length > 0) await requirePictureRoom(actor.userId, pictures.reduce((sum, { photo }) => sum + photo.byteCount, 0));
  const lessonOf = (part: number | undefined): number | null => lessons[(part ?? 0) - 1]?.id ?? null;
  for (const video of videos) {
    const media = await writeVideo(actor, video);
    const { name, title, part } = video.entry;
    // One whose film stayed behind stands where a published one would: what takes its place keeps its words.
    await SeriesMedia.create({ seriesId: series.id, name, title, lessonId: lessonOf(part), draftMediaId: media.id, mediaId: media.state === 'failed' ? media.id : null });
  }
  for (const { publicId, entry: { name, title, part, alt, file }, photo } of pictures) {
    const media = await Media.create({ publicId, ownerId: actor.userId, kind: 'picture', state: 'ready', originalName: nameOfFile(file), ...sizesOf(photo), detail: alt === undefined ? {} : { alt } });
    await SeriesMedia.create({ seriesId: series.id, name, title, lessonId: lessonOf(part), mediaId: media.id });
  }
}

async function writeVideo(actor: Actor, { publicId, entry, detail, filmBytes }: TakenVideo): Promise<Media> {
  const common = { publicId, ownerId: actor.userId, kind: 'video', files: {}, durationMs: entry.durationMs ?? null } as const;
  if (filmBytes === null) {
    return Media.create({ ...common, state: 'failed', originalName: `${entry.name}.mp4`, detail, failure: FILM_STAYED_BEHIND });
  }
  await requireVideoRoom(actor.userId, filmBytes);
  const hasWords = Object.keys(detail).length > 0;
  const media = await Media.create({ ...common, state: 'uploaded', originalName: nameOfFile(entry.film ?? entry.name), byteCount: filmBytes, detail: {}, draftDetail: hasWords ? detail : null });
  await enqueue(processVideo, { video: publicId }, { uniqueKey: `${processVideo.type}:${publicId}` });
  return media;
}

function sizesOf({ files, byteCount, width, height }: TakenPicture['photo']): Pick<TakenPicture['photo'], 'files' | 'byteCount' | 'width' | 'height'> {
  return { files, byteCount, width, height };
}

function nameOfFile(path: string): string {
  return path.slice(path.lastIndexOf('/') + 1).slice(0, 120);
}
