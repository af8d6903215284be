import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { displayName } from '#server/media/display-name.ts';
import { digestOf, takePhoto, type ReadPhoto } from '#server/media/photo.ts';
import { Media, type ProgressPhoto } from '#server/models/index.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { checkpointFor } from './_checkpoint-for.ts';
import { intoThread } from './_into-thread.ts';

export interface PostPhotoInput {
  readonly series: string;
  /** Public id of the lesson with the checkpoint. */
  readonly lesson: string;
  /** What the student says to it; may be empty. */
  readonly words: string;
  /** Finished uploads on disk, shown together in this order, at least one; the caller removes them. */
  readonly files: readonly { readonly path: string; readonly originalName: string }[];
}

interface Taken {
  readonly publicId: string;
  readonly originalName: string;
  readonly digest: string;
  readonly photo: ReadPhoto;
}

/**
 * Shows photos that came whole with a form. Each is read and written anew before any row is made, outside the
 * transaction. One that cannot be taken refuses them all: she sends again what she chose.
 * @throws as `checkpointFor` and `intoThread`; UNSUPPORTED, TOO_LARGE; RATE_LIMITED.
 */
export async function postPhoto(ctx: Context, input: PostPhotoInput): Promise<ProgressPhoto> {
  const at = await checkpointFor(ctx, input);
  const { media: store } = ctx.services;
  const taken: Taken[] = [];
  const takeAway = () => Promise.all(taken.flatMap(({ photo }) => Object.values(photo.files).map(({ key }) => store.remove(key))));
  try {
    for (const { path, originalName } of input.files) {
      await countUse(RATE_RULES.photo, at.actor.publicId);
      await store.requireRoom();
      const publicId = newPublicId();
      taken.push({ publicId, originalName: displayName(originalName), digest: await digestOf(path), photo: await takePhoto(store, path, `photos/${publicId}`) });
    }
    const { photo, isNew } = await intoThread(at, input.words, taken.map(({ digest }) => digest), () => Promise.all(taken.map(({ photo: { byteCount, width, height, files }, ...of }) =>
      Media.create({ ...of, ownerId: at.actor.userId, kind: 'photo', state: 'ready', byteCount, width, height, files, detail: {} }))));
    if (!isNew) await takeAway();
    return photo;
  } catch (error) {
    await takeAway();
    throw error;
  }
}
