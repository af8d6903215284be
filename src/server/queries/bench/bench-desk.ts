/** What lies on the bench: the queue, and for the photo in hand the student's plan and her earlier photos. */
import { fitPiece } from '#core/craft/fit.ts';
import type { FittedPiece } from '#core/craft/fit.ts';
import type { Actor } from '#server/context.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { photoThread, type ThreadPhoto } from '#server/queries/photos/photo-thread.ts';
import { waitingPhotos, type WaitingPhoto } from './waiting-photos.ts';

export interface BenchDesk {
  readonly queue: readonly WaitingPhoto[];
  readonly inHand: {
    readonly photo: WaitingPhoto;
    readonly before: WaitingPhoto | null;
    readonly after: WaitingPhoto | null;
    /** Null when the piece cannot be reckoned for her loom. */
    readonly fitted: FittedPiece | null;
    readonly thread: readonly ThreadPhoto[];
  } | null;
}

/** `wanted` is the public id of the photo to take in hand; without it, or when it was answered, the oldest is taken. */
export async function benchDesk(actor: Actor, wanted: string | null): Promise<BenchDesk> {
  const queue = await waitingPhotos(actor);
  const index = Math.max(0, queue.findIndex(({ publicId }) => publicId === wanted));
  const photo = queue[index];
  if (photo === undefined) return { queue, inHand: null };
  const [{ pattern, mine }, thread] = await Promise.all([piecesOf(photo.seriesId, photo.enrolmentId), photoThread(photo.enrolmentId, photo.lessonId)]);
  const fitted = pattern === null ? null : fitPiece(pattern, mine, actor.units);
  return {
    queue,
    inHand: { photo, before: queue[index - 1] ?? null, after: queue[index + 1] ?? null, fitted: fitted?.ok === true ? fitted.value : null, thread },
  };
}
