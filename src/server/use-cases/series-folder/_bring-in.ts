import type { BroughtIn } from '#contracts/series-folder.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found } from '#server/errors.ts';
import { processVideo } from '#server/jobs/definitions/videos.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Media, SeriesMedia, User, type Lesson, type Series } from '#server/models/index.ts';
import { withZip } from '#server/series-folder/open-zip.ts';
import type { Services } from '#server/services.ts';
import { freeAddress } from '#server/use-cases/series/_free-address.ts';
import { requirePictureRoom } from '#server/use-cases/pictures/_picture-room.ts';
import { requireVideoRoom } from '#server/use-cases/videos/_video-room.ts';
import { checkFolder, checkList } from './_check-folder.ts';
import { makeSeries } from './_make-series.ts';
import { takeMedia, type MediaSteps, type TakenMedia, type TakenPicture, type TakenVideo } from './_take-media.ts';

/** Whose it becomes. */
export interface Receiver {
  readonly ownerId: number;
  readonly workroomId: number;
}

export interface BringInSteps extends MediaSteps {
  /** The last act of the transaction that makes the series. */
  also(series: Series, told: BroughtIn): Promise<void>;
}

const FILM_STAYED_BEHIND = 'The film did not come with its series. Send it here; captions and chapters are kept when it is as long as it was.';

/**
 * Makes a draft series of the zip at `path`: all of it, or nothing.
 * @throws VALIDATION with a sentence for each file that stands in the way; CONFLICT when the room for videos or pictures
 * is used up; UNAVAILABLE when the disk is full; the signal's reason when it aborts.
 */
export async function bringIn({ media: store }: Services, receiver: Receiver, path: string, steps: BringInSteps): Promise<void> {
  await withZip(path, async (zip) => {
    await checkList(zip);
    const folder = await checkFolder((name) => zip.text(name));
    steps.signal.throwIfAborted();
    await store.requireRoom();
    const media = await takeMedia(store, zip, folder.file, steps);
    try {
      await withTransaction(async () => {
        const { series, lessons } = await makeSeries({ workroomId: receiver.workroomId, slug: await freeAddress(folder.file.title) }, folder);
        await writeMedia(receiver, series, lessons, media);
        await steps.also(series, { partCount: lessons.length, filmCount: media.videos.filter(({ filmBytes }) => filmBytes !== null).length, toMend: folder.toMend });
      });
    } catch (error) {
      await media.undo();
      throw error;
    }
  });
}

async function writeMedia({ ownerId }: Receiver, series: Series, lessons: readonly Lesson[], { videos, pictures }: TakenMedia): Promise<void> {
  // The person's row is the lock of her room for videos and for pictures.
  found(await User.findByPk(ownerId, { lock: true }));
  if (pictures.length > 0) await requirePictureRoom(ownerId, pictures.reduce((sum, { photo }) => sum + photo.byteCount, 0));
  const lessonOf = (part: number | undefined): number | null => lessons[(part ?? 0) - 1]?.id ?? null;
  for (const video of videos) {
    const media = await writeVideo(ownerId, video);
    const { name, title, part } = video.entry;
    // One whose film stayed behind stands where a published one would: what takes its place keeps its words.
    await SeriesMedia.create({ seriesId: series.id, name, title, lessonId: lessonOf(part), draftMediaId: media.id, mediaId: media.state === 'failed' ? media.id : null });
  }
  for (const { publicId, entry: { name, title, part, alt, file }, photo } of pictures) {
    const media = await Media.create({ publicId, ownerId, kind: 'picture', state: 'ready', originalName: nameOfFile(file), ...sizesOf(photo), detail: alt === undefined ? {} : { alt } });
    await SeriesMedia.create({ seriesId: series.id, name, title, lessonId: lessonOf(part), mediaId: media.id });
  }
}

async function writeVideo(ownerId: number, { publicId, entry, detail, filmBytes }: TakenVideo): Promise<Media> {
  const common = { publicId, ownerId, kind: 'video', files: {}, durationMs: entry.durationMs ?? null } as const;
  if (filmBytes === null) {
    return Media.create({ ...common, state: 'failed', originalName: `${entry.name}.mp4`, detail, failure: FILM_STAYED_BEHIND });
  }
  await requireVideoRoom(ownerId, filmBytes);
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
