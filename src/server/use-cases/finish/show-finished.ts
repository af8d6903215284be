import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { signedIn } from '#server/errors.ts';
import { displayName } from '#server/media/display-name.ts';
import { keepingFilesOnlyWithRows } from '#server/media/only-with-rows.ts';
import { digestOf, takePhoto } from '#server/media/photo.ts';
import { Media } from '#server/models/index.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { heldRow, writableBy } from './_finished-row.ts';
import { offWall } from './_off-wall.ts';
import { forgetPhoto } from './_forget-photo.ts';

export interface ShowFinishedInput {
  readonly series: string;
  /** A finished upload on disk; the caller removes it. */
  readonly file: { readonly path: string; readonly originalName: string };
}

/**
 * Puts the photo of a finished piece in its place; the one before it goes, and with it what she agreed to show. It is read and written anew before any row
 * is made, like every photo.
 * @throws as `writableBy`; UNSUPPORTED, TOO_LARGE; RATE_LIMITED.
 */
export async function showFinished(ctx: Context, { series, file }: ShowFinishedInput): Promise<void> {
  const { userId: ownerId, publicId: person } = signedIn(ctx);
  const { seat } = await writableBy(ctx, series);
  const { media: store } = ctx.services;
  await countUse(RATE_RULES.photo, person);
  await store.requireRoom();
  const publicId = newPublicId();
  const { byteCount, width, height, files } = await takePhoto(store, file.path, `photos/${publicId}`);
  const digest = await digestOf(file.path);
  const before = await keepingFilesOnlyWithRows(store, { files }, () => withTransaction(async () => {
    const row = await heldRow(seat.enrolmentId);
    const media = await Media.create({ publicId, ownerId, kind: 'photo', state: 'ready', originalName: displayName(file.originalName), digest, byteCount, width, height, files, detail: {} });
    const { mediaId } = row;
    await row.update({ mediaId: media.id });
    await offWall(ctx, seat.enrolmentId);
    return mediaId;
  }));
  await forgetPhoto(store, before);
}
