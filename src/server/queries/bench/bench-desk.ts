/** What lies on the bench: the queue, and for the photo in hand the student's plan and her earlier photos. */
import { fitPiece } from '#core/craft/fit.ts';
import type { FittedPiece } from '#core/craft/fit.ts';
import { techniquesOfPart } from '#core/following/techniques-of-part.ts';
import type { TechniqueName } from '#core/craft/piece.ts';
import type { StepOfPart } from '#core/following/see-to-mend.ts';
import type { NoteInput } from '#contracts/bench.ts';
import type { Actor } from '#server/context.ts';
import { HeldVerdict, ProgressPhoto, User } from '#server/models/index.ts';
import { factsOfPart } from '#server/queries/lessons/facts-of-part.ts';
import { piecesOf } from '#server/queries/pieces/pieces-of.ts';
import { photoThread, type ThreadPhoto, type ThreadShot } from '#server/queries/photos/photo-thread.ts';
import { earlierPhotos, type EarlierPhoto } from './earlier-photos.ts';
import { phrasesOfWorkroom } from './phrases-of.ts';
import { questionsAbout, type AskedAboutPhoto } from './questions-about.ts';
import { waitingPhotos, type WaitingPhoto } from './waiting-photos.ts';

/** What was said of a photo and taken back: words and pins to go on with. */
export interface TakenBack {
  readonly words: string;
  readonly notes: readonly NoteInput[];
  readonly see: string | null;
  readonly by: string;
  readonly byOther: boolean;
}

export interface PhotoInHand {
  readonly photo: WaitingPhoto;
  readonly before: WaitingPhoto | null;
  readonly after: WaitingPhoto | null;
  /** Null when the piece cannot be reckoned for her loom. */
  readonly fitted: FittedPiece | null;
  /** Of this checkpoint, the photo in hand among them. */
  readonly thread: readonly ThreadPhoto[];
  /** Index of the photo in hand among them: newer ones may wait behind it. */
  readonly placeInThread: number;
  /** Shown together: the photo in hand and those beside it. */
  readonly shots: readonly ThreadShot[];
  /** Of the whole seat, the newest first, without the one in hand. */
  readonly earlier: readonly EarlierPhoto[];
  readonly phrases: readonly string[];
  /** Steps of the part as students read it. */
  readonly steps: readonly StepOfPart[];
  readonly techniques: readonly TechniqueName[];
  readonly takenBack: TakenBack | null;
  /** What she asked about her photos of this checkpoint. */
  readonly asked: readonly AskedAboutPhoto[];
}

export interface BenchDesk {
  readonly queue: readonly WaitingPhoto[];
  readonly inHand: PhotoInHand | null;
}

/** `wanted` is the public id of the photo to take in hand; without it, or when it was answered, the first of the queue is taken. */
export async function benchDesk(actor: Actor, wanted: string | null): Promise<BenchDesk> {
  const queue = await waitingPhotos(actor);
  const index = Math.max(0, queue.findIndex(({ publicId }) => publicId === wanted));
  const photo = queue[index];
  if (photo === undefined) return { queue, inHand: null };
  const [{ pattern, mine }, thread, earlier, phrases, takenBack, facts, asked] = await Promise.all([
    piecesOf(photo.seriesId, photo.enrolmentId),
    photoThread(photo.enrolmentId, photo.lessonId),
    earlierPhotos(photo.enrolmentId, photo.publicId),
    phrasesOfWorkroom(photo.workroomId),
    takenBackOf(actor, photo.publicId),
    factsOfPart(photo.lessonId),
    questionsAbout(photo.enrolmentId, photo.lessonId),
  ]);
  const fitted = pattern === null ? null : fitPiece(pattern, mine, actor.units);
  const placeInThread = thread.findIndex(({ publicId }) => publicId === photo.publicId);
  return {
    queue,
    inHand: { photo, before: queue[index - 1] ?? null, after: queue[index + 1] ?? null, fitted: fitted?.ok === true ? fitted.value : null, thread, placeInThread, shots: thread[placeInThread]?.shots ?? [], earlier, phrases, takenBack, steps: facts?.steps ?? [], techniques: techniquesOfPart(pattern, facts?.amounts ?? []), asked },
  };
}

async function takenBackOf(actor: Actor, publicId: string): Promise<TakenBack | null> {
  const photo = await ProgressPhoto.findOne({ where: { publicId } });
  const held = photo === null ? null : await HeldVerdict.findByPk(photo.id);
  if (held === null || held.goesOutAt !== null) return null;
  const by = await User.findByPk(held.byId);
  return { words: held.words, notes: held.notes, see: held.see, by: by?.name ?? '', byOther: held.byId !== actor.userId };
}
