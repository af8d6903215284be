import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found, signedIn } from '#server/errors.ts';
import { displayName } from '#server/media/display-name.ts';
import { keepingFilesOnlyWithRows } from '#server/media/only-with-rows.ts';
import { takePhoto } from '#server/media/photo.ts';
import { Media, SeriesMedia, User } from '#server/models/index.ts';
import { freeName } from '#server/use-cases/videos/_video-name.ts';
import { ownLesson } from '#server/use-cases/workroom/_own-series.ts';
import { requirePictureRoom } from './_picture-room.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';

export interface PutInPictureInput {
  /** Public id of the part it is put in for. */
  readonly lesson: string;
  /** What it shows; empty for a picture that only decorates. */
  readonly alt: string;
  /** A finished upload on disk; the caller removes it. */
  readonly path: string;
  readonly originalName: string;
}

/** As long as a text may say what a picture shows. */
const LONGEST_ALT = 200;

/**
 * Takes a picture into the series of a part, under a name of its own. It is read and written anew as photos are, before
 * any row is made. Students see it once a published text speaks of it.
 * @throws NOT_FOUND for another teacher's part; UNSUPPORTED, TOO_LARGE; CONFLICT when the teacher's room is used up.
 */
export async function putInPicture(ctx: Context, input: PutInPictureInput): Promise<string> {
  const actor = signedIn(ctx);
  const { lesson, series } = await ownLesson(ctx, input.lesson);
  await countUse(RATE_RULES.picture, actor.publicId);
  await ctx.services.media.requireRoom();
  const publicId = newPublicId();
  const picture = await takePhoto(ctx.services.media, input.path, `pictures/${publicId}`);
  const originalName = displayName(input.originalName);
  return keepingFilesOnlyWithRows(ctx.services.media, picture, () => withTransaction(async () => {
    // The person's row is the lock of her room: pictures sent at once are counted one after the other.
    found(await User.findByPk(actor.userId, { lock: true }));
    await requirePictureRoom(actor.userId, picture.byteCount);
    const { byteCount, width, height, files } = picture;
    const media = await Media.create({ publicId, ownerId: actor.userId, kind: 'picture', state: 'ready', originalName, byteCount, width, height, files, detail: { alt: input.alt.trim().slice(0, LONGEST_ALT) } });
    const title = originalName.replace(/\.\w{1,5}$/, '');
    const name = await freeName(series.id, title, 'picture');
    await SeriesMedia.create({ seriesId: series.id, name, title, mediaId: media.id, lessonId: lesson.id });
    return name;
  }));
}
